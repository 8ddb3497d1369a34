"""What follows from the trails of numbers: grades and uncertainties."""

from __future__ import annotations

from abc import ABC, abstractmethod

from dropkit.properties.property_words import GRADED
from dropkit.provenance import Grade, Trail, worst_grade

__all__ = ["Traced"]


class Traced(ABC):
    """Numbers, each with the trail of how it was made: of a fluid, or at one condition."""

    __slots__ = ()

    @abstractmethod
    def available(self) -> tuple[str, ...]:
        """Names of the properties that can be asked.

        Returns
        -------
        tuple of str
            In the order of tables.
        """

    @abstractmethod
    def trail(self, prop: str) -> Trail:
        """How a property was made.

        Parameters
        ----------
        prop : str
            A property such as ``"viscosity"``.

        Returns
        -------
        Trail
            Of its records, methods and cautions.

        Examples
        --------
        >>> import dropkit as dk
        >>> dk.air("20 degC").trail("density").method
        'virial equation with second and third coefficients'
        """

    def grade(self, prop: str | None = None) -> Grade:
        """The grade of a property, or the worst of density, viscosity and surface tension.

        Parameters
        ----------
        prop : str, optional
            A property such as ``"viscosity"``.

        Returns
        -------
        str
            One of `dropkit.provenance.GRADES`, which says what each means.

        Raises
        ------
        UnknownName, MissingProperty
            No property is called so; it is not known here.

        Examples
        --------
        >>> import dropkit as dk
        >>> dk.liquid("water").at("20 degC").grade()
        'reference'
        """
        if prop is not None:
            return self.trail(prop).grade
        held = [self.trail(name).grade for name in GRADED if name in self.available()]
        return worst_grade(held) if held else "estimated"

    def uncertainty(self, prop: str) -> float | None:
        """Relative standard uncertainty (k = 1) of a property.

        Parameters
        ----------
        prop : str
            A property such as ``"viscosity"``.

        Returns
        -------
        float or None
            The largest of an array's elements [-]; None where none is known, as out of range.

        Raises
        ------
        UnknownName, MissingProperty
            No property is called so; it is not known here.

        Examples
        --------
        >>> import dropkit as dk
        >>> dk.liquid("water").at("20 degC").uncertainty("viscosity")
        0.005
        """
        return self.trail(prop).uncertainty
