"""Uses an installed dropkit the way a stranger would: run by .ci/run, far from any checkout.

Arguments: folders that hold a checkout; nothing may be imported or read from them.
"""

from __future__ import annotations

import pickle
import platform
import sys
from importlib import metadata
from pathlib import Path

import dropkit as dk
from dropkit import records

checkouts = [Path(argument).resolve() for argument in sys.argv[1:]]


def outside(path: Path) -> bool:
    """Whether `path` lies in none of the checkouts."""
    return not any(path.resolve().is_relative_to(checkout) for checkout in checkouts)


# The package comes from this environment, with its records, its marker for type checkers, and
# none of what belongs to the checkout only.
package = Path(dk.__file__).parent
data = Path(records.data_dir())
assert outside(package), package
assert outside(data), data
assert package.is_relative_to(sys.prefix), package
assert data == package / "data", data
assert (package / "py.typed").is_file()
shipped = [str(path) for path in metadata.files("dropkit") or []]
assert "dropkit/data/dropkit-data.toml" in shipped
assert not [name for name in shipped if "data/build" in name or name.startswith("tests")], shipped
assert metadata.version("dropkit") == dk.__version__

# One liquid: water at 20 degC, 998.2 kg/m3 and 1.002 mPa*s (IAPWS, as every handbook has it).
water = dk.liquid("water")
assert abs(water.density(293.15) / 998.2 - 1) < 1e-3
assert abs(water.viscosity(293.15) / 1.002e-3 - 1) < 5e-3
assert str(water.viscosity("20 degC").units) == "millipascal * second"

# One mixture: 40 % glycerol by mass at 20 degC has 3.72 mPa*s (Segur and Oberstar 1951).
mix = dk.mixture({"glycerol": 0.4, "water": "rest"}, by="mass")
state = mix.at("20 degC")
assert abs(mix.viscosity(293.15) / 3.72e-3 - 1) < 0.03, mix.viscosity(293.15)
ohnesorge = dk.numbers.ohnesorge(state.density, state.viscosity, state.surface_tension, "60 um")
assert 0.05 < ohnesorge < 0.07, ohnesorge
assert pickle.loads(pickle.dumps(mix)).viscosity(293.15) == mix.viscosity(293.15)
assert "Segur" in dk.cite(mix)

print(
    f"dropkit {dk.__version__} on Python {platform.python_version()}: glycerol 40 % at 20 degC has "
    f"{mix.viscosity('20 degC'):.3g~P}, Ohnesorge {ohnesorge:.3f} at 60 um"
)
