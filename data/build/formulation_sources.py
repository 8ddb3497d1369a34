"""Which formulations CoolProp 8.0.0 evaluates for the organic liquids, and where they come from.

The keys name files in `data/sources`, whose citations are those of CoolProp's own library of
references. n-Pentane's viscosity is left out (a fifth low), ethylbenzene's too (unpublished).
"""

from __future__ import annotations

from typing import NamedTuple


class Formulation(NamedTuple):
    """One fluid: its name in CoolProp, the sources, and the highest temperature wanted [K]."""

    fluid: str
    density: str
    viscosity: str
    high: float

    @property
    def density_words(self) -> str:
        return f"the equation of state {self.density} via CoolProp"

    @property
    def viscosity_words(self) -> str:
        return f"the correlation {self.viscosity} via CoolProp"


FORMULATIONS = {
    "110-82-7": Formulation("CycloHexane", "Zhou2014", "Tariq2014", 383.15),
    "106-42-3": Formulation("p-Xylene", "Zhou2012", "Balogun2015", 413.15),
    "108-38-3": Formulation("m-Xylene", "Zhou2012", "Cao2016mxylene", 413.15),
    "95-47-6": Formulation("o-Xylene", "Zhou2012", "Cao2016oxylene", 413.15),
    "111-65-9": Formulation("n-Octane", "Beckmueller2019", "HuberLaesecke2004alkanes", 413.15),
    "71-43-2": Formulation("Benzene", "Thol2012", "Avgeri2014", 383.15),
    "124-18-5": Formulation("n-Decane", "LemmonSpan2006", "HuberLaesecke2004alkanes", 413.15),
    "60-29-7": Formulation("DiethylEther", "Thol2014", "", 323.15),
    "110-54-3": Formulation("n-Hexane", "Thol2019hexane", "Michailidou2013", 363.15),
    "107-06-2": Formulation("Dichloroethane", "Thol2015", "", 373.15),
    "616-38-6": Formulation("DimethylCarbonate", "Zhou2011", "", 383.15),
    "111-84-2": Formulation("n-Nonane", "LemmonSpan2006", "HuberLaesecke2004alkanes", 413.15),
    "109-99-9": Formulation("Tetrahydrofuran", "Fiedler2023", "", 353.15),
    "109-66-0": Formulation("n-Pentane", "Thol2019pentane", "", 323.15),
    "1120-21-4": Formulation("n-Undecane", "Aleksandrov2011", "", 413.15),
    "100-41-4": Formulation("EthylBenzene", "Zhou2012", "", 413.15),
}
