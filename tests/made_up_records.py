"""A small data folder of invented liquids, complete and consistent, for tests to read or break.

The liquids alpha and beta, the salt gamma and all their sources don't exist.
"""

from __future__ import annotations

from pathlib import Path

from dropkit import sealing

MARKER = 'format = 1\nversion = "0.0.1"\n'

SOURCES = {
    "Able1901": 'citation = "Able A., invented paper, 1901"\ndoi = "10.0/able"\nseen = "invented"\n',
    "Baker1902": 'citation = "Baker B., invented paper, 1902"\ndoi = ""\nseen = "invented"\n',
    "Cook1903": 'citation = "Cook C., invented paper, 1903"\ndoi = "10.0/cook"\nseen = "invented"\n',
    "CookCopy": 'citation = "Copy"\nseen = "invented"\nbased_on = ["Cook1903"]\n',
    "Recalled": 'citation = "Nobody"\nseen = "from memory"\n',
    "ThermoMLArchive": 'citation = "Invented archive"\nseen = "invented"\n',
}

ALPHA = """# An invented liquid.
name = "alpha"
cas = "11-23-4"  # no such number
formula = "A2"
family = "invented"
synonyms = ["Alpha Liquid", "first liquid"]
seal = ""
[molar_mass]
value = 0.0500
source = "Able1901"
[melting_point]
value = 260.0
source = "Able1901"
[boiling_point]
value = 380.0
source = "Able1901"
[critical_temperature]
value = 600.0
source = "Able1901"
[flash_point]
value = 290.0
method = "closed cup"
source = "Able1901"
[hazards]
notes = ["Invented."]
source = "Able1901"

[[density]]
form = "polynomial"
coefficients = [1000.0, -0.50]  # the last zero must survive
centre = 300.0
range = [260.0, 400.0]
mixture_range = [250.0, 400.0]
mixture_range_reason = "an invented extension"
uncertainty = 0.001
grade = "measured"
sources = ["Able1901", "Baker1902"]
place = "Table 1"
obtained = "fitted here to 3 points"
second = { source = "Cook1903", points = 2, median = 0.0001, worst = 0.0003 }
left_out = { how = "source Baker1902 left out", median = 0.0002, p95 = 0.0004 }
checks = [{ T = 300.0, value = 1000.1, source = "Cook1903", place = "Table 2", tolerance = 0.001 }]
points = ["liquids/Able1901"]

[[viscosity]]
form = "vogel"
coefficients = [-4.0, 500.0, 150.0]
range = [260.0, 330.0]
mixture_range = [250.0, 330.0]
uncertainty = 0.01
grade = "single"
sources = ["Able1901"]
place = "Table 3"
obtained = "as published"
checks = [{ T = 300.0, value = 0.5134, source = "Able1901", tolerance = 0.01 }]

[[viscosity]]
form = "exp_polynomial"
coefficients = [-0.66666, -0.022]
centre = 300.0
range = [300.0, 400.0]
uncertainty = 0.2
grade = "single"
sources = ["Baker1902"]
place = "Table 3"
obtained = "as published"
checks = [{ T = 300.0, value = 0.5134, source = "Able1901", tolerance = 0.01 }]

[[surface_tension]]
form = "guggenheim"
s0 = 0.06
n = 1.22
critical_temperature = 600.0
range = [250.0, 400.0]
uncertainty_absolute = 0.0005
grade = "reference"
sources = ["Able1901"]
place = "equation 4"
obtained = "as published"
checks = [{ T = 300.0, value = 0.02576, source = "Cook1903", place = "Table 1", tolerance = 0.01 }]
cautions = ["surface tension of a clean liquid"]

[[vapour_pressure]]
form = "antoine"
coefficients = [9.4798714, 1700.0, 0.0]
range = [280.0, 400.0]
uncertainty = 0.02
grade = "single"
sources = ["Able1901"]
place = "Table 5"
obtained = "as published"
checks = [{ T = 380.0, value = 101325.0, source = "Able1901", tolerance = 0.01 }]

[[heat_of_vaporisation]]
form = "polynomial"
coefficients = [651000.0, -100.0]
centre = 300.0
range = [280.0, 400.0]
uncertainty = 0.05
grade = "recalled"
sources = ["Recalled"]
place = "nowhere"
obtained = "as remembered"
checks = [{ T = 300.0, value = 650000.0, source = "Recalled", tolerance = 0.05 }]
"""

BETA = """name = "beta"
cas = "44-32-1"
formula = "B"
family = "invented"
amphiphile = true
synonyms = ["BTA"]
seal = ""
[molar_mass]
value = 0.100
source = "Able1901"

[[density]]
form = "polynomial"
coefficients = [800.0, -0.8]
centre = 300.0
range = [250.0, 400.0]
uncertainty = 0.001
grade = "single"
sources = ["Baker1902"]
place = "Table 1"
obtained = "as published"
checks = [{ T = 300.0, value = 800.0, source = "Baker1902", tolerance = 0.001 }]

[[viscosity]]
form = "vogel"
coefficients = [-8.0, 300.0, 100.0]
range = [250.0, 330.0]
uncertainty = 0.01
grade = "single"
sources = ["Baker1902"]
place = "Table 2"
obtained = "as published"
checks = [{ T = 300.0, value = 0.001503, source = "Baker1902", tolerance = 0.001 }]
"""

GAMMA = """name = "gamma"
cas = "99-99-9"
formula = "G"
family = "salt"
kind = "solute"
[molar_mass]
value = 0.058
source = "Able1901"
"""

ALPHA_BETA = """components = ["alpha", "beta"]

[[density]]
form = "redlich_kister"
transform = "reciprocal"
basis = "mass"
coefficients = [[1e-5, 1e-6], [2e-6]]
range = [260.0, 400.0]
fraction_range = [0.0, 1.0]
uncertainty = 0.001
grade = "measured"
sources = ["Able1901"]
place = "Table 9"
obtained = "fitted here to 4 points"
second = { source = "Baker1902", points = 2, median = 0.0001, worst = 0.0003 }
left_out = { how = "every fifth point left out", median = 0.0002 }
checks = [
    { T = 300.0, fraction = 0.5, value = 886.9, source = "Able1901", tolerance = 0.001 },
]
points = ["mixtures/Able1901"]

[[viscosity]]
form = "redlich_kister"
transform = "log"
basis = "volume"
coefficients = [[0.5, -0.2]]
range = [260.0, 330.0]
fraction_range = [0.0, 1.0]
uncertainty = 0.02
grade = "single"
sources = ["Able1901"]
place = "Table 9"
obtained = "as published"
checks = [{ T = 300.0, fraction = 1.0, value = 0.5134, source = "Able1901", tolerance = 0.001 }]
"""

PUBLISHED = {
    "liquids/Able1901": (
        "# source: Able A., invented paper, 1901\n# seen: invented\n# uncertainty: none\n"
        "liquid,property,T_K,value,doi\n"
        "alpha,density,300.0,1000.2,\nalpha,density,320,990.1,\nalpha,density,400,700,\n"
    ),
    "mixtures/Able1901": (
        "# source: Able A., invented paper, 1901\n# seen: invented\n# uncertainty: none\n"
        "component_1,component_2,basis,fraction_1,T_K,property,value,doi\n"
        "alpha,beta,mass,0.5,300,density,887.0,\nalpha,beta,mole,0.5,300,density,850,10.0/able\n"
    ),
}
EXCLUDED = (
    "file,component_1,component_2,property,T_K,fraction_1,value,reason,contradicting_source\n"
    'liquids/Able1901,alpha,,density,400.0,,700.0,"invented, a slip",Cook1903\n'
    "mixtures/Able1901,alpha,beta,density,300,0.5,850.0,invented slip,Cook1903\n"
)

AMBIGUOUS = '[greek]\nchoices = ["alpha", "beta"]\nnote = "Say which"\n'


def write(root: Path, *, seal: bool = True) -> Path:
    """Write the folder and seal it; gives `root` back."""
    files = {
        "dropkit-data.toml": MARKER,
        "ambiguous.toml": AMBIGUOUS,
        "liquids/alpha.toml": ALPHA,
        "liquids/beta.toml": BETA,
        "liquids/gamma.toml": GAMMA,
        "mixtures/alpha__beta.toml": ALPHA_BETA,
        "published/excluded.csv": EXCLUDED,
        **{f"sources/{key}.toml": text for key, text in SOURCES.items()},
        **{f"published/{name}.csv": text for name, text in PUBLISHED.items()},
    }
    for name, text in files.items():
        path = root / name
        path.parent.mkdir(parents=True, exist_ok=True)
        path.write_text(text, encoding="utf-8", newline="")
    if seal:
        assert sealing.main(["seal"], root=root) == 0
    return root


def edit(root: Path, name: str, old: str, new: str, count: int = 1) -> None:
    """Replace text in one file of the folder; the text must be there."""
    path = root / name
    text = path.read_bytes().decode("utf-8")
    assert old in text, f"{name} has no {old!r}"
    path.write_text(text.replace(old, new, count), encoding="utf-8", newline="")


def reseal(root: Path, name: str) -> None:
    """Seal a file whatever it holds, as somebody who goes round the command would."""
    from dropkit.record_store import parse_file, seal_of

    path = root / name
    text = path.read_bytes().decode("utf-8")
    seal = seal_of(parse_file(str(root), name))
    path.write_text(sealing.sealed_text(text, seal), encoding="utf-8", newline="")
