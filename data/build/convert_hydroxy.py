"""More vapour pressures of alcohols, glycols and glycol ethers, into `data/published`.

    python data/build/convert_hydroxy.py

`convert_organics.py` carries the Antoine constants of one collection only. Here are the Wagner
constants of the same book and the Antoine constants of two further collections, as the data files
of chemicals 1.5.2 have them, evaluated at a few temperatures through thermo 0.6.1.
"""

from __future__ import annotations

import csv
import warnings
from pathlib import Path

from compact_points import compact
from convert_organics import CAS, CHEMICALS, EVALUATED, LIQUID, PUBLISHED, grid

KEYS = (
    "1-butanol", "isobutanol", "2-butanol", "tert-butanol", "1-pentanol", "1-hexanol", "1-octanol",
    "1-nonanol", "1-decanol", "cyclohexanol", "benzyl_alcohol", "diacetone_alcohol", "terpineol",
    "dipropylene_glycol", "1-3-propanediol", "2-methoxyethanol", "2-ethoxyethanol",
    "2-butoxyethanol", "diethylene_glycol_monobutyl_ether", "diethylene_glycol_monoethyl_ether",
    "1-methoxy-2-propanol", "tetraethylene_glycol", "triethylene_glycol", "diethylene_glycol",
)  # fmt: skip
SETS = {
    "Poling2001": (
        "WAGNER_POLING",
        "# source: Poling B.E., Prausnitz J.M., O'Connell J.P., The Properties of Gases and "
        "Liquids, 5th ed. (2001), appendix A, Wagner constants",
    ),
    "LandoltBornstein1999": (
        "LANDOLT",
        "# source: Landolt-Boernstein, New Series IV/20, Vapor Pressure of Chemicals (1999-2001), "
        "Antoine constants",
    ),
    "NISTWebBookAntoine": (
        "ANTOINE_WEBBOOK",
        "# source: NIST Chemistry WebBook, Antoine constants of the phase-change pages",
    ),
}


def main() -> None:
    """Write one file per collection."""
    warnings.simplefilter("ignore")
    from thermo import VaporPressure

    for source, (method, head) in SETS.items():
        rows = []
        for key in KEYS:
            known = VaporPressure(CASRN=CAS[key])
            if method not in known.all_methods:
                continue
            low, high = known.T_limits[method]
            for T in grid(key, low, high):
                value = float(known.calculate(T, method))
                if value > 0.0:
                    rows.append([key, "vapour_pressure", f"{T:.2f}", f"{value:.5g}", "equation"])
        path = Path(PUBLISHED) / "liquids" / f"{source}_hydroxy.csv"
        with path.open("w", encoding="utf-8", newline="") as handle:
            for line in (head, CHEMICALS, "# uncertainty: not stated in the copy", EVALUATED):
                handle.write(line + "\n")
            writer = csv.writer(handle, lineterminator="\n")
            writer.writerow(LIQUID)
            writer.writerows(rows)
        compact(path)


if __name__ == "__main__":
    main()
