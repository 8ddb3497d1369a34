"""What the engines get wrong, chemical by chemical: left out, cut, or given a wider uncertainty.

Found by comparing CoolProp 8.0.0 and thermo 0.6.1 (data of chemicals 1.5.2) with published values
and with each other. A method may be sound for hundreds of chemicals and wrong for one.
"""

from __future__ import annotations

from typing import Final, NamedTuple

__all__ = [
    "ANY",
    "EXCLUDED",
    "LIMITED",
    "WIDER",
    "Exclusion",
    "Limit",
    "Widening",
    "exclusion_reason",
]

# In place of the names of methods: all of them.
ANY: Final = ("*",)


class Exclusion(NamedTuple):
    """A method that is never used for one property of one chemical.

    Parameters
    ----------
    cas, property : str
        Which chemical and property.
    methods : tuple of str
        Names of methods; ``("*",)`` for all.
    reason : str
        What is wrong, and what shows it.
    """

    cas: str
    property: str
    methods: tuple[str, ...]
    reason: str


class Limit(NamedTuple):
    """A method that is used between narrower limits than it states.

    Parameters
    ----------
    cas, property : str
        Which chemical and property.
    methods : tuple of str
        Names of methods; ``("*",)`` for all.
    low, high : float
        Limits [K].
    reason : str
        What goes wrong outside.
    """

    cas: str
    property: str
    methods: tuple[str, ...]
    low: float
    high: float
    reason: str


class Widening(NamedTuple):
    """A method that published values of one chemical contradict more than those of others.

    Parameters
    ----------
    cas, property, method : str
        Which one.
    uncertainty : float
        Relative standard uncertainty (k = 1) in place of the method's own.
    reason : str
        What the published values say.
    """

    cas: str
    property: str
    method: str
    uncertainty: float
    reason: str


_GLYCOL_ETHER: Final = "no handbook line for a glycol ether's surface tension has held a comparison"
_OTHER_CHEMICAL: Final = "its row carries this CAS number but names, and fits, "

EXCLUDED: Final[tuple[Exclusion, ...]] = (
    # ---- viscosity
    Exclusion(
        "109-66-0",  # n-pentane
        "viscosity",
        ("HEOS",),
        "19 % low at 25 degC against three handbooks, 23 to 29 % low at 340 to 380 K against the "
        "VDI table",
    ),
    Exclusion(
        "56-81-5",  # glycerol
        "viscosity",
        ANY,
        "thermo's default gives 1550 mPa*s at 20 degC where tables have 1410, and its VDI "
        "equation rises with temperature above 240 degC",
    ),
    Exclusion(
        "100-51-6",  # benzyl alcohol
        "viscosity",
        ("DIPPR_PERRY_8E",),
        "26 to 32 % low at 400 to 421 K against published values",
    ),
    # ---- surface tension
    Exclusion(
        "7732-18-5",  # water
        "surface_tension",
        ANY,
        "0.08 to 1.5 % off IAPWS R1-76; dropkit's own record of water holds that equation",
    ),
    Exclusion(
        "64-17-5",  # ethanol
        "surface_tension",
        ("REFPROP",),
        "2.9 % low at 60 degC against Jasper's measured line",
    ),
    Exclusion(
        "67-64-1",  # acetone
        "surface_tension",
        ("REFPROP",),
        "3.2 % below Jasper's measured line at 25 degC",
    ),
    Exclusion(
        "100-51-6",  # benzyl alcohol
        "surface_tension",
        ANY,
        "Jasper's line gives 34.8 mN/m and the VDI's equation 39.2 mN/m at 25 degC",
    ),
    Exclusion(
        "98-95-3",  # nitrobenzene
        "surface_tension",
        ("JASPER",),
        "a copying slip: 1.7 to 2.2 mN/m above a second copy of Jasper's table",
    ),
    Exclusion(
        "75-05-8",  # acetonitrile
        "surface_tension",
        ("JASPER",),
        "a copying slip: 1.7 to 2.1 mN/m below a second copy of Jasper's table",
    ),
    Exclusion(
        "108-94-1",  # cyclohexanone
        "surface_tension",
        ("JASPER",),
        "a copying slip in the slope: 0.8 mN/m above a second copy of Jasper's table at 5 degC, "
        "1.0 mN/m below it at 100 degC",
    ),
    Exclusion(
        "126-73-8",  # tributyl phosphate
        "surface_tension",
        ("JASPER",),
        "8 to 23 % above a second copy of Jasper's table",
    ),
    Exclusion(
        "590-18-1",  # cis-2-butene
        "surface_tension",
        ("REFPROP",),
        "9 to 14 % below the equation that CoolProp holds under the same authors' name",
    ),
    Exclusion(
        "1678-91-7",  # ethylcyclohexane
        "surface_tension",
        ("REFPROP",),
        _OTHER_CHEMICAL + "ethylbenzene: 16 to 25 % above two other handbooks",
    ),
    Exclusion("109-86-4", "surface_tension", ANY, _GLYCOL_ETHER),  # 2-methoxyethanol
    Exclusion("110-80-5", "surface_tension", ANY, _GLYCOL_ETHER),  # 2-ethoxyethanol
    Exclusion("111-76-2", "surface_tension", ANY, _GLYCOL_ETHER),  # 2-butoxyethanol
    # ---- vapour pressure
    Exclusion(
        "100-51-6",  # benzyl alcohol
        "vapour_pressure",
        ANY,
        "134 % too high at 25 degC where thermo's default is read below its limits; no measured "
        "value decides among the others (12 to 13 Pa)",
    ),
    Exclusion(
        "1678-91-7",  # ethylcyclohexane
        "vapour_pressure",
        ("WAGNER_MCGARRY",),
        _OTHER_CHEMICAL + "ethylbenzene: 15 to 20 % below two other handbooks",
    ),
    Exclusion(
        "1678-93-9",  # butylcyclohexane
        "vapour_pressure",
        ("WAGNER_MCGARRY",),
        _OTHER_CHEMICAL + "butylbenzene: 9 to 11 % below another handbook",
    ),
)

LIMITED: Final[tuple[Limit, ...]] = (
    Limit(
        "107-21-1",  # ethylene glycol
        "viscosity",
        ANY,
        283.15,
        1e4,
        "used from 10 degC up: the engines' fits part below (97 to 165 mPa*s at -10 degC)",
    ),
)

WIDER: Final[tuple[Widening, ...]] = (
    Widening(
        "112-30-1",  # 1-decanol
        "density",
        "DIPPR_PERRY_8E",
        0.004,
        "published values at 20 to 65 degC lie 0.7 % higher",
    ),
    Widening(
        "64-18-6",  # formic acid
        "density",
        "VDI_PPDS",
        0.003,
        "published values at 25 degC lie 0.5 to 0.6 % higher",
    ),
    Widening(
        "67-66-3",  # chloroform
        "density",
        "VDI_PPDS",
        0.003,
        "published values at 20 to 50 degC lie 0.3 to 0.45 % lower",
    ),
    Widening(
        "100-51-6",  # benzyl alcohol
        "viscosity",
        "VDI_PPDS",
        0.06,
        "published values at 25 degC lie 3 to 11 % higher",
    ),
    Widening(
        "97-64-3",  # ethyl lactate
        "surface_tension",
        "JASPER",
        0.02,
        "published values at 20 to 50 degC lie 3 to 4 % higher",
    ),
)


def exclusion_reason(cas: str, prop: str, method: str) -> str | None:
    """Why a method is never used for a property of a chemical, or None.

    Parameters
    ----------
    cas, prop, method : str
        CAS registry number, word of the interface, name of the method.

    Examples
    --------
    >>> exclusion_reason("109-66-0", "viscosity", "HEOS")[:21]
    '19 % low at 25 degC a'
    """
    for entry in EXCLUDED:
        if (entry.cas, entry.property) == (cas, prop) and (
            entry.methods == ANY or method in entry.methods
        ):
            return entry.reason
    return None
