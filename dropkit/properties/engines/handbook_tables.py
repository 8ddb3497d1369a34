"""The coefficient tables that thermo's named methods read, one row at a time.

thermo takes its coefficients from the data files of the package chemicals. They are read here as
text: importing the packages for one row costs seconds, and with pandas 3.1 chemicals 1.5.2 emits
deprecation warnings that a strict program turns into errors. A file that is missing or has other
columns than those known raises EngineError; nothing is guessed.
"""

from __future__ import annotations

import os
from collections.abc import Mapping
from functools import cache
from typing import Final, NamedTuple

from dropkit.errors import EngineError
from dropkit.records import LOCK

__all__ = [
    "TABLES",
    "HandbookTable",
    "Identity",
    "handbook_row",
    "handbook_versions",
    "identity_of",
    "molar_mass_of",
]


class HandbookTable(NamedTuple):
    """One coefficient table in the data files of chemicals.

    Parameters
    ----------
    folder, file : str
        Where it lies within the package.
    columns : tuple of str
        The columns that must be there; the first one holds the CAS number.
    """

    folder: str
    file: str
    columns: tuple[str, ...]


_PERRY: Final = ("C1", "C2", "C3", "C4")
_ENDS: Final = ("Tmin", "Tmax")

TABLES: Final[dict[str, HandbookTable]] = {
    "perry density": HandbookTable(
        "Density", "Perry Parameters 105.tsv", ("CAS", "Chemical", *_PERRY, *_ENDS)
    ),
    "vdi density": HandbookTable(
        "Density",
        "VDI PPDS Density of Saturated Liquids.tsv",
        ("CAS", "Chemical", "MW", "Tc", "rhoc", "A", "B", "C", "D"),
    ),
    "perry viscosity": HandbookTable(
        "Viscosity",
        "Table 2-313 Viscosity of Inorganic and Organic Liquids.tsv",
        ("CAS", "Chemical", *_PERRY, "C5", *_ENDS),
    ),
    "vdi viscosity": HandbookTable(
        "Viscosity",
        "VDI PPDS Dynamic viscosity of saturated liquids polynomials.tsv",
        ("CAS", "Chemical", "Formula", "A", "B", "C", "D", "E"),
    ),
    "mulero surface tension": HandbookTable(
        "Interface",
        "MuleroCachadinaParameters.tsv",
        ("CAS", "Fluid", "sigma0", "n0", "sigma1", "n1", "sigma2", "n2", "Tc", *_ENDS),
    ),
    "jasper surface tension": HandbookTable(
        "Interface", "Jasper-Lange.tsv", ("CAS", "Name", "a", "b", *_ENDS)
    ),
    "vdi surface tension": HandbookTable(
        "Interface",
        "VDI PPDS surface tensions.tsv",
        ("CAS", "Chemical", "Tm", "Tc", "A", "B", "C", "D", "E"),
    ),
    "mcgarry vapour pressure": HandbookTable(
        "Vapor Pressure",
        "Wagner Original McGarry.tsv",
        ("CAS", "Name", "A", "B", "C", "D", "Pc", "Tc", "Tmin"),
    ),
    "perry vapour pressure": HandbookTable(
        "Vapor Pressure",
        "Table 2-8 Vapor Pressure of Inorganic and Organic Liquids.tsv",
        ("CAS", "Chemical", *_PERRY, "C5", *_ENDS),
    ),
    "vdi vapour pressure": HandbookTable(
        "Vapor Pressure",
        "VDI PPDS Boiling temperatures at different pressures.tsv",
        ("CAS", "Chemical", "Tm", "Tc", "Pc", "A", "B", "C", "D"),
    ),
    "perry heat of vaporisation": HandbookTable(
        "Phase Change",
        "Table 2-150 Heats of Vaporization of Inorganic and Organic Liquids.tsv",
        ("CAS", "Chemical", "Tc", *_PERRY, *_ENDS),
    ),
    "vdi heat of vaporisation": HandbookTable(
        "Phase Change",
        "VDI PPDS Enthalpies of vaporization.tsv",
        ("CAS", "Chemical", "MW", "Tc", "A", "B", "C", "D", "E"),
    ),
    "perry heat capacity": HandbookTable(
        "Heat Capacity",
        "Perry_Table_2-153_DIPPR_100.tsv",
        ("CAS", "Chemical", "A", "B", "C", "D", "E", *_ENDS),
    ),
    "perry thermal conductivity": HandbookTable(
        "Thermal Conductivity",
        "Table 2-315 Thermal Conductivity of Inorganic and Organic Liquids.tsv",
        ("CAS", "Chemical", *_PERRY, "C5", *_ENDS),
    ),
    "vdi thermal conductivity": HandbookTable(
        "Thermal Conductivity",
        "VDI PPDS Thermal conductivity of saturated liquids.tsv",
        ("CAS", "Chemical", "A", "B", "C", "D", "E"),
    ),
    "crc static permittivity": HandbookTable(
        "Electrolytes",
        "Permittivity (Dielectric Constant) of Liquids.tsv",
        ("CAS", "Chemical", "T", "Permittivity", "A", "B", "C", "D", *_ENDS),
    ),
}

# Files of identifiers (tab-separated, no header: number, CAS, formula, molar mass, three codes,
# systematic name, usual name, ...).
_IDENTIFIERS: Final = (
    "chemical identifiers pubchem small.tsv",
    "chemical identifiers example user db.tsv",
    "Inorganic db.tsv",
)
# Searched as it lies, for the rare ones: 40 MB.
_MORE_IDENTIFIERS: Final = "chemical identifiers pubchem large.tsv"


class Identity(NamedTuple):
    """What a CAS number stands for, as the engine's files of identifiers have it.

    Parameters
    ----------
    name : str
        The usual name.
    formula : str
        Molecular formula.
    molar_mass : float
        [kg/mol].
    """

    name: str
    formula: str
    molar_mass: float


@cache
def handbook_versions() -> str:
    """Versions of thermo and of chemicals, which holds its data.

    Raises
    ------
    EngineError
        If one of them is not installed.
    """
    from importlib.metadata import PackageNotFoundError, version

    try:
        return f"{version('thermo')} (chemicals {version('chemicals')})"
    except PackageNotFoundError as error:
        raise EngineError(
            f"the engine thermo is incomplete: {error}", hint="Install dropkit again"
        ) from None


@cache
def _folder() -> str:
    from importlib.util import find_spec

    found = find_spec("chemicals")
    if found is None or not found.submodule_search_locations:
        raise EngineError(
            "the engine thermo has no data: the package chemicals is not installed",
            hint="Install dropkit again",
        )
    return found.submodule_search_locations[0]


def _lines(folder: str, file: str) -> list[str]:
    path = os.path.join(_folder(), folder, file)
    try:
        with open(path, encoding="utf-8") as text:
            return text.read().splitlines()
    except (OSError, UnicodeDecodeError) as error:
        raise EngineError(
            f"thermo {handbook_versions()}: its table '{folder}/{file}' cannot be read ({error})",
            hint="dropkit knows chemicals 1.5.2; another version may hold its data elsewhere",
        ) from None


@cache
def _table(key: str) -> Mapping[str, str]:
    """CAS number -> line of a table, not yet split: few of them are ever asked for."""
    table = TABLES[key]
    header, *rows = _lines(table.folder, table.file)
    if tuple(header.split("\t")) != table.columns:
        raise EngineError(
            f"thermo {handbook_versions()}: its table '{table.file}' has other columns than known",
            allowed=", ".join(table.columns),
            hint="dropkit knows chemicals 1.5.2",
        )
    return {row.partition("\t")[0]: row for row in rows}


def handbook_row(key: str, cas: str) -> Mapping[str, str] | None:
    """The row of a chemical in a table, as texts by column.

    Parameters
    ----------
    key : str
        One of `TABLES`, such as ``"perry density"``.
    cas : str
        CAS registry number.

    Returns
    -------
    mapping or None
        None where the table lacks the chemical.

    Raises
    ------
    EngineError
        If the table is missing or has other columns than known.

    Examples
    --------
    >>> handbook_row("perry density", "110-82-7")["Tmin"]
    '279.69'
    """
    with LOCK:
        line = _table(key).get(cas)
    if line is None:
        return None
    return dict(zip(TABLES[key].columns, line.split("\t"), strict=True))


@cache
def _identifiers() -> Mapping[str, str]:
    """CAS number -> line of the files of identifiers."""
    found: dict[str, str] = {}
    for file in _IDENTIFIERS:
        for line in _lines("Identifiers", file):
            found.setdefault(line.split("\t", 2)[1], line)
    return found


def _rare(cas: str) -> str | None:
    """The line of a CAS number in the large file of identifiers, found without reading it all."""
    import mmap

    path = os.path.join(_folder(), "Identifiers", _MORE_IDENTIFIERS)
    wanted = f"\t{cas}\t".encode()
    try:
        with open(path, "rb") as file, mmap.mmap(file.fileno(), 0, access=mmap.ACCESS_READ) as text:
            place = text.find(wanted)
            while place >= 0:
                start = text.rfind(b"\n", 0, place) + 1
                # A synonym further on in the line of another chemical does not count.
                if b"\t" not in text[start:place]:
                    return text[start : text.find(b"\n", place)].decode("utf-8")
                place = text.find(wanted, place + 1)
    except (OSError, ValueError) as error:
        raise EngineError(
            f"thermo {handbook_versions()}: its file '{_MORE_IDENTIFIERS}' cannot be read ({error})"
        ) from None
    return None


@cache
def identity_of(cas: str) -> Identity | None:
    """Name, formula and molar mass of a chemical, or None where no file has it.

    Parameters
    ----------
    cas : str
        CAS registry number, already checked.

    Raises
    ------
    EngineError
        If a file of identifiers cannot be read.

    Examples
    --------
    >>> identity_of("110-82-7").formula
    'C6H12'
    """
    with LOCK:
        line = _identifiers().get(cas) or _rare(cas)
    if line is None:
        return None
    parts = line.split("\t")
    return Identity(parts[8] or parts[7], parts[2], float(parts[3]) * 1e-3)


def molar_mass_of(cas: str) -> float | None:
    """Molar mass [kg/mol] of a chemical in the engine's tables, or None.

    Parameters
    ----------
    cas : str
        CAS registry number.

    Examples
    --------
    >>> molar_mass_of("110-82-7")
    0.08416
    """
    row = handbook_row("vdi density", cas)
    if row is not None:
        return float(row["MW"]) * 1e-3
    with LOCK:
        line = _identifiers().get(cas)
    return None if line is None else float(line.split("\t", 4)[3]) * 1e-3
