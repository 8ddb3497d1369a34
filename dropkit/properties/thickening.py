"""Dissolved polymers by their published intrinsic viscosities: `thickener`, and what it finds."""

from __future__ import annotations

from typing import TYPE_CHECKING, Any, NamedTuple

from dropkit import records, units
from dropkit.errors import BadInput, MissingProperty, OutOfRange, UnknownName, nearest
from dropkit.properties.polymer_laws import Chain, entry_chain, entry_salts
from dropkit.records import PropertyRecord, ThickenerRecord, fold

if TYPE_CHECKING:
    import pandas as pd

__all__ = ["Chosen", "Thickener", "thickener"]

ROOM = 298.15


class Chosen(NamedTuple):
    """An entry of a thickener as it serves one material in one salt solution.

    Parameters
    ----------
    entry : PropertyRecord
        The entry.
    chain : Chain
        Intrinsic viscosity and law.
    own : bool
        Whether the intrinsic viscosity is the user's own.
    uncertainty : float or None
        Of the intrinsic viscosity, relative, k = 1.
    """

    entry: PropertyRecord
    chain: Chain
    own: bool
    uncertainty: float | None


def _asked(**given: Any) -> units.Asked | None:
    """How arguments were given: None where all are bare numbers."""
    ways = (units.read(value, kind, kind, plausible=False)[1] for kind, value in given.items())
    return next((way for way in ways if way is not None), None)


def thickener(name: str) -> Thickener:
    """A dissolved polymer whose intrinsic viscosity was published.

    Parameters
    ----------
    name : str
        Name, synonym, short form or CAS number, such as ``"sodium alginate"`` or ``"PEO"``.

    Returns
    -------
    Thickener
        With its entries.

    Raises
    ------
    UnknownName
        With the names of all; for some polymers no source was seen.

    Examples
    --------
    >>> import dropkit as dk
    >>> dk.thickener("PEO").name
    'poly(ethylene oxide)'
    """
    known = records.thickener_records()
    names = {
        fold(word): record
        for record in known.values()
        for word in (record.key, record.name, record.cas, *record.synonyms)
        if word
    }
    found = names.get(fold(name)) if isinstance(name, str) else None
    if found is None:
        held = [record.name for record in known.values()]
        words = [word for record in known.values() for word in (record.name, *record.synonyms)]
        raise UnknownName(
            f"no intrinsic viscosity of '{name}' is held",
            allowed=", ".join(held),
            choices=nearest(str(name), words),
            hint="A liquid whose viscosity you measured goes in with fluid() or with_values()",
        )
    return Thickener(found)


class Thickener:
    """A polymer and what was published of its coils in solution.

    Made by `thickener`; see there for an example.

    Parameters
    ----------
    record : ThickenerRecord
        The record.
    """

    def __init__(self, record: ThickenerRecord) -> None:
        self.record = record
        self.key = record.key
        self.name = record.name

    def __eq__(self, other: object) -> bool:
        return isinstance(other, Thickener) and other.record == self.record

    def __hash__(self) -> int:
        return hash(("Thickener", self.key))

    @property
    def entries(self) -> tuple[PropertyRecord, ...]:
        """What was published: one entry for each material or relation over molar mass."""
        return self.record.properties["intrinsic_viscosity"]

    @property
    def cautions(self) -> tuple[str, ...]:
        """What to know before use."""
        return tuple(f"{self.name}: {text}" for text in self.record.cautions)

    @property
    def sources(self) -> tuple[str, ...]:
        """Keys of the sources of all entries."""
        return tuple(dict.fromkeys(key for entry in self.entries for key in entry.sources))

    def table(self) -> pd.DataFrame:
        """All entries with their conditions, laws, grades and sources.

        Returns
        -------
        pandas.DataFrame
            One row for each entry and salt concentration, in SI.

        Examples
        --------
        >>> import dropkit as dk
        >>> table = dk.thickener("CMC").table()
        >>> float(table.loc[table["salt [mol/m3]"] == 50.0, "[eta] [m3/kg]"].iloc[0])
        0.8941
        """
        import pandas as pd

        rows = []
        for number, entry in enumerate(self.entries, 1):
            p = entry.parameters
            for place, salt in enumerate(p["salt_concentration"]):
                low, high = p["molar_mass_range"]
                if entry.form == "sample":
                    value = p["values"][place]
                else:
                    value = f"{p['unit'] * p['factor']:.4g} (M/(g/mol))^{p['exponent']:.4g}"
                rows.append(
                    {
                        "entry": number,
                        "M [kg/mol]": f"{low:g} to {high:g}",
                        "salt [mol/m3]": salt,
                        "T [K]": f"{entry.range.low:g} to {entry.range.high:g}",
                        "[eta] [m3/kg]": value,
                        "law": p["law"],
                        "constant": p["constants"][place],
                        "largest c[eta]": p["limits"][place],
                        "u([eta])": entry.uncertainty,
                        "u(law)": p["law_uncertainty"],
                        "grade": entry.grade,
                        "sources": ", ".join(entry.sources),
                    }
                )
        return pd.DataFrame(rows)

    # ------------------------------------------------ values
    def intrinsic_viscosity(
        self,
        molar_mass: Any,
        *,
        salt: Any = 0.0,
        temperature: Any = ROOM,
        entry: int | None = None,
    ) -> Any:
        """Intrinsic viscosity: the limit of specific viscosity over concentration.

        Holds in water for the materials that were measured; a charged polymer needs its salt.

        Parameters
        ----------
        molar_mass : number or with a unit
            Molar mass [kg/mol], weight average, such as ``"400 kDa"``.
        salt : number or with a unit, optional
            Concentration of sodium chloride [mol/m3].
        temperature : temperature, optional
            Where it is asked [K]; 25 degC by default.
        entry : int, optional
            Number of the entry in `table`; by default the first that serves.

        Returns
        -------
        float or Quantity
            Intrinsic viscosity [m3/kg].

        Raises
        ------
        MissingProperty
            No entry serves that molar mass and salt; says which there are.
        OutOfRange
            The temperature is outside that of the entry.

        Examples
        --------
        >>> import dropkit as dk
        >>> print(f"{dk.thickener('PEO').intrinsic_viscosity('400 kDa'):.3g}")
        410 milliliter / gram
        """
        chosen = self.chosen(molar_mass=molar_mass, salt=salt, entry=entry)
        kelvin = self._kelvin(chosen, temperature)
        asked = _asked(molar_mass=molar_mass, molar_concentration=salt, temperature=temperature)
        return units.give(float(chosen.chain.intrinsic_at(kelvin)), "intrinsic_viscosity", asked)

    def overlap_concentration(
        self,
        molar_mass: Any,
        *,
        salt: Any = 0.0,
        temperature: Any = ROOM,
        entry: int | None = None,
    ) -> Any:
        """Where coils begin to fill the solution: the inverse of the intrinsic viscosity.

        Holds where the intrinsic viscosity does; the definition is a convention, others differ
        by a small factor.

        Parameters
        ----------
        molar_mass : number or with a unit
            Molar mass [kg/mol], weight average, such as ``"400 kDa"``.
        salt : number or with a unit, optional
            Concentration of sodium chloride [mol/m3].
        temperature : temperature, optional
            Where it is asked [K]; 25 degC by default.
        entry : int, optional
            Number of the entry in `table`; by default the first that serves.

        Returns
        -------
        float or Quantity
            Mass concentration [kg/m3].

        Raises
        ------
        MissingProperty
            No entry serves that molar mass and salt; says which there are.
        OutOfRange
            The temperature is outside that of the entry.

        References
        ----------
        J. Chem. Soc., Faraday Trans. 1 80 (1984) 1233, doi:10.1039/F19848001233: that c* is about
        1/[eta] is what is observed.

        Examples
        --------
        >>> import dropkit as dk
        >>> print(f"{dk.thickener('PEO').overlap_concentration('400 kDa'):.3g}")
        2.44 gram / liter
        """
        chosen = self.chosen(molar_mass=molar_mass, salt=salt, entry=entry)
        kelvin = self._kelvin(chosen, temperature)
        asked = _asked(molar_mass=molar_mass, molar_concentration=salt, temperature=temperature)
        return units.give(
            1.0 / float(chosen.chain.intrinsic_at(kelvin)), "mass_concentration", asked
        )

    def _kelvin(self, chosen: Chosen, temperature: Any) -> float:
        kelvin = units.single(temperature, "temperature", "temperature")
        if not chosen.entry.range.holds(kelvin):
            raise OutOfRange(
                f"{self.name}: {kelvin:g} K is outside the entry", allowed=str(chosen.entry.range)
            )
        return kelvin

    # ------------------------------------------------ the entry that serves
    def chosen(
        self,
        *,
        molar_mass: Any = None,
        intrinsic_viscosity: Any = None,
        salt: Any = 0.0,
        uncertainty: Any = None,
        entry: int | None = None,
    ) -> Chosen:
        """The entry that serves a material in a salt solution; for dropkit's own layers.

        Parameters
        ----------
        molar_mass : number or with a unit, optional
            Molar mass [kg/mol].
        intrinsic_viscosity : number or with a unit, optional
            The user's own [m3/kg], in place of that which follows from the molar mass.
        salt : number or with a unit
            Concentration of sodium chloride [mol/m3].
        uncertainty : number, optional
            Of the user's own, relative (k = 1).
        entry : int, optional
            Its number in `table`; by default the first that serves.

        Returns
        -------
        Chosen
            The entry and its chain.

        Raises
        ------
        BadInput
            Neither or both of the two are given.
        MissingProperty
            No entry serves; says which there are.
        """
        if (molar_mass is None) == (intrinsic_viscosity is None):
            raise BadInput(
                f"{self.name} needs one of molar_mass and intrinsic_viscosity",
                allowed="; ".join(self._seen()),
                hint="An intrinsic viscosity measured on your own lot is the surer of the two",
            )
        if uncertainty is not None and intrinsic_viscosity is None:
            raise BadInput("uncertainty is that of your own intrinsic_viscosity, which is missing")
        held = units.single(salt, "molar_concentration", "salt", plausible=False)
        own = mass = spread = None
        if intrinsic_viscosity is None:
            mass = units.single(molar_mass, "molar_mass", "molar_mass", plausible=False)
        else:
            own = units.single(
                intrinsic_viscosity, "intrinsic_viscosity", "intrinsic_viscosity", plausible=True
            )
        if uncertainty is not None:
            spread = units.single(uncertainty, "ratio", "uncertainty")
            if not 0.0 <= spread < 1.0:
                raise BadInput(f"The uncertainty is {spread:g}", allowed="relative, 0 to 1")
        for one in self._numbered(entry):
            if not self._serves(one, mass, held):
                continue
            chain = entry_chain(one, mass, held, own)
            known = spread if own is not None else one.uncertainty
            return Chosen(one, chain, own is not None, known)
        what = f"[eta] {own:g} m3/kg" if mass is None else f"{mass:g} kg/mol"
        raise MissingProperty(
            f"no data were seen for {self.name} of {what} in water with {held:g} mol/m3 of sodium "
            "chloride",
            allowed="; ".join(self._seen()),
            hint="With an intrinsic viscosity of your own, measured in that salt solution, only "
            "the salt must fit: intrinsic_viscosity='... mL/g'"
            if own is None
            else "The law over concentration was seen at these salt concentrations only",
        )

    def _numbered(self, entry: int | None) -> tuple[PropertyRecord, ...]:
        """The entry of a number, or all."""
        if entry is None:
            return self.entries
        if type(entry) is not int or not 1 <= entry <= len(self.entries):
            raise BadInput(
                f"{self.name} has no entry {entry!r}", allowed=f"1 to {len(self.entries)}"
            )
        return (self.entries[entry - 1],)

    def _serves(self, entry: PropertyRecord, mass: float | None, salt: float) -> bool:
        if mass is not None:
            low, high = entry.parameters["molar_mass_range"]
            if not low <= mass <= high:
                return False
        if self.record.charge == "neutral":
            return True
        lowest, highest = entry_salts(entry)
        return lowest <= salt <= highest

    def _seen(self) -> list[str]:
        """The conditions of each entry in words."""
        found = []
        for entry in self.entries:
            low, high = entry.parameters["molar_mass_range"]
            text = f"{low:g} to {high:g} kg/mol"
            if self.record.charge != "neutral":
                stated = entry.parameters["salt_concentration"]
                span = f"{stated[0]:g}" if len(stated) == 1 else f"{stated[0]:g} to {stated[-1]:g}"
                text += f" in {span} mol/m3 of sodium chloride"
            found.append(f"{text} at {entry.range.low - 273.15:.4g} to "
                         f"{entry.range.high - 273.15:.4g} degC")  # fmt: skip
        return found

    def __repr__(self) -> str:
        from dropkit.properties import display

        header = ("molar mass [kg/mol]", "salt [mol/m3]", "law", "largest c[eta]", "grade")
        rows = []
        for entry in self.entries:
            p = entry.parameters
            low, high = p["molar_mass_range"]
            salts = p["salt_concentration"]
            span = f"{salts[0]:g}" if len(salts) == 1 else f"{salts[0]:g} to {salts[-1]:g}"
            most = p["limits"]
            reach = f"{most[0]:g}" if len(most) == 1 else f"{min(most):g} to {max(most):g}"
            rows.append((f"{low:g} to {high:g}", span, str(p["law"]), reach, str(entry.grade)))
        title = f"Thickener {self.name}, {self.record.charge}, in water"
        return f"{title}\n{display.text_table(header, rows)}"
