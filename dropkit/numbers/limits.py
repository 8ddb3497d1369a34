"""Limits that the trade quotes for the numbers, with source and with how each was seen.

They are rules of thumb and results of particular apparatus, not laws; none says that a process
will work. The length scale of a limit is that of its number.
"""

from __future__ import annotations

from bisect import bisect_right
from dataclasses import dataclass
from typing import Final, Literal, TypeAlias

from dropkit.errors import BadInput, UnknownName, nearest

__all__ = ["LIMITS", "Limit", "limits_of"]

Seen: TypeAlias = Literal["abstract", "text", "second hand", "computed", "memory", "practice"]


@dataclass(frozen=True, slots=True)
class Limit:
    """Values of a number at which the trade sees the behaviour change.

    Parameters
    ----------
    number : str
        Name of the function in `dropkit.numbers`.
    bounds : tuple of float
        The values, ascending.
    sides : tuple of str
        What is said of the values below the first bound, between each two, above the last.
    applies : str
        To what it applies.
    source : str
        Key of the source, a file in ``data/sources``; empty for common practice.
    seen : str
        ``"text"`` or ``"abstract"`` of the source, ``"second hand"`` (as quoted by others),
        ``"computed"`` here from the source's equation, ``"memory"`` or common ``"practice"``.
    note : str
        What else to know, such as limits that contradict it.

    Examples
    --------
    >>> limits_of("z_number")[0].side(7.0)
    'drops form'
    """

    number: str
    bounds: tuple[float, ...]
    sides: tuple[str, ...]
    applies: str
    source: str
    seen: Seen
    note: str = ""

    def side(self, value: float) -> str:
        """What the trade says at a value.

        Parameters
        ----------
        value : float
            A value of the number, in SI.

        Returns
        -------
        str
            One of `sides`; ``"unknown"`` for NaN.
        """
        return "unknown" if value != value else self.sides[bisect_right(self.bounds, value)]

    def __str__(self) -> str:
        bounds = ", ".join(f"{bound:g}" for bound in self.bounds)
        origin = {"practice": "common practice"}.get(self.seen, f"{self.source}, {self.seen}")
        return f"{bounds} for {self.applies} ({origin})"


_NOZZLE: Final = "drop-on-demand nozzles"
_JET: Final = "jets in still gas"
_DROP: Final = "drops in a gas stream, Oh below 0.1"
_FIELD: Final = "one drop"

LIMITS: Final[tuple[Limit, ...]] = (
    Limit(
        "z_number",
        (4.0, 14.0),
        ("too viscous", "drops form", "satellites"),
        _NOZZLE,
        "JangKimMoon2009",
        "abstract",
        "Z says nothing about speed: the drop may still stay in the nozzle, or splash.",
    ),
    Limit(
        "z_number",
        (1.0, 10.0),
        ("too viscous", "drops form", "satellites"),
        _NOZZLE,
        "ReisDerby2000",
        "memory",
        "The window most often quoted; Jang et al. put it at 4 to 14.",
    ),
    Limit(
        "z_number",
        (2.0,),
        ("no stable drops", "drops form"),
        _NOZZLE,
        "Fromm1984",
        "memory",
    ),
    Limit(
        "weber",
        (4.0,),
        ("too slow to leave the nozzle", "fast enough to leave the nozzle"),
        _NOZZLE,
        "Derby2010",
        "memory",
        "On the diameter of the nozzle.",
    ),
    Limit(
        "weber",
        (8.0,),
        ("drips", "jets"),
        "jets from nozzles, LIQUID Weber number",
        "LinReitz1998",
        "second hand",
        "Clanet and Lasheras: 4 where the tip is far smaller than the capillary length, less for "
        "wider tips.",
    ),
    Limit(
        "weber_radius",
        (3.12,),
        ("drips (absolutely unstable)", "jets (convectively unstable)"),
        "inviscid jets with one speed, on the RADIUS",
        "LeibGoldstein1986",
        "computed",
        "3.12255 from Rayleigh's relation; 4 from the long-wave equation; less with viscosity.",
    ),
    Limit(
        "gas_weber",
        (0.4, 13.0, 40.3),
        ("Rayleigh breakup", "first wind-induced", "second wind-induced", "atomisation"),
        _JET,
        "LinReitz1998",
        "second hand",
        "Turbulence and cavitation in the nozzle shift the last two by a factor of several; the "
        "first is also given as 1.2 + 3.41 Oh^0.9.",
    ),
    Limit(
        "gas_weber",
        (11.0, 35.0, 80.0, 350.0),
        ("stays whole", "bag breakup", "multimode", "sheet thinning", "catastrophic"),
        _DROP,
        "Guildenbecher2009",
        "text",
        "Boundaries differ between authors by up to 2 times; the first is 11 +- 2, by others "
        "12 (1 + 1.077 Oh^1.6).",
    ),
    Limit(
        "splash_parameter",
        (50.0,),
        ("does not splash", "splashes"),
        "drops on a flat dry surface",
        "Derby2010",
        "memory",
        "After Stow and Hadfield; smooth dry surfaces run from 50 to 150 with roughness and gas "
        "pressure.",
    ),
    Limit(
        "splash_parameter",
        (57.7,),
        ("spreads", "splashes"),
        "drops on a dry surface, NORMAL speed",
        "Mundo1995",
        "second hand",
        "As K, not its square (3330).",
    ),
    Limit(
        "wavelength_ratio",
        (3.141592653589793,),
        ("does not grow", "grows"),
        "waves on a jet",
        "Rayleigh1878",
        "computed",
    ),
    Limit(
        "wavelength_ratio",
        (3.5, 7.0),
        ("uneven drops", "even drops", "uneven drops"),
        "vibrated jets",
        "SchneiderHendricks1964",
        "memory",
        "Best at 4.5 (BerglundLiu1973, second hand).",
    ),
    Limit(
        "reduced_wavenumber",
        (1.0,),
        ("grows", "does not grow"),
        "waves on a jet",
        "Rayleigh1878",
        "computed",
        "Fastest at 0.697 on an inviscid jet.",
    ),
    Limit(
        "rayleigh_charge_ratio",
        (-1.0, 1.0),
        ("bursts", "holds its charge", "bursts"),
        _FIELD,
        "Rayleigh1882",
        "second hand",
        "Without an outer field.",
    ),
    Limit(
        "fissility",
        (1.0,),
        ("holds its charge", "bursts"),
        _FIELD,
        "Rayleigh1882",
        "second hand",
        "Without an outer field.",
    ),
    Limit(
        "taylor_field_ratio",
        (-1.0, 1.0),
        ("bursts", "stretched", "bursts"),
        _FIELD,
        "Taylor1964",
        "abstract",
        "Large swaying drops in a horizontal field burst at 0.6 (an abstract).",
    ),
    Limit(
        "peclet_evaporation",
        (1.0,),
        ("dries through", "piles up at the surface"),
        "solutes and particles in a drying drop",
        "Vehring2008",
        "memory",
    ),
    Limit(
        "capillary",
        (0.01,),
        ("squeezing", "dripping"),
        "drops made in a T-junction",
        "Garstecki2006",
        "second hand",
        "Outer liquid's viscosity; depends on the geometry, 0.01 to 0.02.",
    ),
    Limit(
        "reynolds",
        (2300.0,),
        ("laminar", "may be turbulent"),
        "flow in a long round pipe",
        "",
        "practice",
        "Short and smooth nozzles stay laminar to far higher values.",
    ),
    Limit(
        "reynolds",
        (15.0,),
        ("jet swells", "jet contracts"),
        "laminar jets from a long pipe",
        "MiddlemanGavis1961",
        "memory",
        "14 to 16; towards 0.866 of the diameter above about 100 to 150.",
    ),
    Limit(
        "biot",
        (0.6,),
        ("one temperature inside", "hotter outside than inside"),
        "drops, on the DIAMETER",
        "",
        "practice",
        "The rule 0.1 is for volume over surface, a sixth of the diameter.",
    ),
)


def limits_of(number: str) -> tuple[Limit, ...]:
    """The limits that the trade quotes for one number.

    Parameters
    ----------
    number : str
        Name of a function in `dropkit.numbers`, such as ``"z_number"``.

    Returns
    -------
    tuple of Limit
        The limits, best seen first; empty for a number without any.

    Raises
    ------
    UnknownName
        For a name that is no number.
    BadInput
        For what is no text.

    Examples
    --------
    >>> for limit in limits_of("splash_parameter"):
    ...     print(limit)
    50 for drops on a flat dry surface (Derby2010, memory)
    57.7 for drops on a dry surface, NORMAL speed (Mundo1995, second hand)
    """
    if not isinstance(number, str):
        raise BadInput(
            f"a {type(number).__name__} names no number", allowed="a name, such as 'z_number'"
        )
    found = tuple(limit for limit in LIMITS if limit.number == number)
    if not found:
        # Imported here: the catalogue imports this module.
        from dropkit.numbers.catalogue import entries

        names = [entry.name for entry in entries()]
        if number not in names:
            raise UnknownName(
                f"no number is called {number!r}",
                choices=nearest(number, names),
                hint="dropkit.numbers.overview() lists them all",
            )
    return found
