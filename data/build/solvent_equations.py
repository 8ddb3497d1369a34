"""Published equations of the solvents and hydrocarbons, evaluated for `convert_solvents.py`.

Coefficients are digit for digit those that were seen; every set says where.
"""

from __future__ import annotations

import math
from collections.abc import Mapping

from handbook_equations import (
    CHEMICALS,
    EVALUATED,
    MOLAR_MASS,
    Equations,
    R,
    grid,
    perry,
    rows,
    vdi,
    wagner,
)
from hexadecane_equations import (
    density,
    heat_capacity,
    heat_of_vaporisation,
    speed_of_sound,
    viscosity,
)

__all__ = ["EQUATIONS", "hexadecane_rows"]

# --- others --------------------------------------------------------------------------------
# Cp/R = A1 + A2 (T/100) + A3 (T/100)^2 + A4 (T/100)^3; range K
ZABRANSKY = {
    "2-butanone": [(18.9452, -1.36988, 0.374249, 0.0344146, 190.8, 353.1)],
    "toluene": [(21.6638, -7.51813, 2.97181, -0.255049, 162.0, 350.0),
                (2.78361, 8.6649, -1.65192, 0.185306, 350.0, 500.0)],
    "n-dodecane": [(177.21, -136.308, 44.8939, -4.70443, 266.7, 310.0),
                   (30.7315, 5.4457, -0.833098, 0.212448, 310.0, 483.2)],
    "n-hexadecane": [(169.484, -106.995, 32.9166, -3.12299, 293.1, 350.0),
                     (98.8261, -46.4313, 15.6126, -1.47499, 350.0, 453.6)],
    "dimethyl_sulfoxide": [(4.86997, 10.8521, -3.09858, 0.329476, 295.8, 415.1)],
}  # fmt: skip


def _zabransky() -> Equations:
    found: list[list[str]] = []
    for liquid, parts in ZABRANSKY.items():
        for a, b, c, d, low, high in parts:
            found += rows(
                liquid,
                "heat_capacity",
                lambda T, a=a, b=b, c=c, d=d, m=MOLAR_MASS[liquid]: (
                    R / m * (a + b * T / 100 + c * (T / 100) ** 2 + d * (T / 100) ** 3)
                ),
                grid(low, min(high, 423.2), 10.0),
            )

    def ethyl_acetate(T: float) -> float:
        r = T / 523.2
        cp = 12.4186 * math.log(1 - r) + 6.62706 / (1 - r) + 12.1932 + 5.81788 * r
        return R / MOLAR_MASS["ethyl_acetate"] * cp

    found += rows("ethyl_acetate", "heat_capacity", ethyl_acetate, grid(253.0, 340.3, 10.0))
    head = [
        "# source: Zabransky M., Ruzicka V., Majer V., Domalski E.S., Heat Capacity of Liquids: "
        "Critical Review and Recommended Values, J. Phys. Chem. Ref. Data Monograph 6 (1996), and "
        "its supplement; spline and quasi-polynomial coefficients",
        CHEMICALS,
        "# uncertainty: classes II (below 1 %) to IV (3 to 5 %) by liquid and range; the class "
        "limits are from memory",
        EVALUATED,
    ]
    return Equations(head, found)


def _mulero() -> Equations:
    # sum s_i (1 - T/Tc)^n_i, N/m; range K
    table: Mapping[str, tuple[float, list[tuple[float, float]], float, float]] = {
        "acetone": (508.1, [(0.0633, 1.16)], 182.06, 353.15),
        "toluene": (591.75, [(0.06897, 1.291)], 176.65, 473.15),
        "n-dodecane": (658.1, [(0.0154, 4.18), (0.048, 1.17)], 273.15, 473.15),
        "n-heptane": (540.13, [(0.07765, 1.319), (-0.02599, 1.6)], 183.0, 540.08),
    }
    found: list[list[str]] = []
    for liquid, (Tc, terms, low, high) in table.items():
        found += rows(
            liquid,
            "surface_tension",
            lambda T, Tc=Tc, terms=terms: sum(s * (1.0 - T / Tc) ** n for s, n in terms),
            grid(low, min(high, 423.2)),
        )
    head = [
        "# source: Mulero A., Cachadina I., Parra M.I., J. Phys. Chem. Ref. Data 41 (2012) 043105, "
        "doi:10.1063/1.4768782, correlation through the data of many laboratories",
        CHEMICALS + "; the same in CoolProp 8.0.0, which names the paper",
        "# uncertainty: not stated in the copy",
        EVALUATED,
    ]
    return Equations(head, found)


def _bell() -> Equations:
    table: Mapping[str, tuple[float, list[tuple[float, float]], float, float]] = {
        "2-butanone": (536.7, [(0.05812319654893337, 1.1006476182531342)], 273.15, 323.3),
        "ethyl_acetate": (
            523.3,
            [(-0.07907760636072793, 6.927434782194497), (0.06554811610755354, 1.2237426782677407)],
            199.15, 518.15,
        ),
        "dimethyl_sulfoxide": (707.0, [(0.07956752592495375, 1.1257848234658587)], 291.05, 480.15),
    }  # fmt: skip
    found: list[list[str]] = []
    for liquid, (Tc, terms, low, high) in table.items():
        found += rows(
            liquid,
            "surface_tension",
            lambda T, Tc=Tc, terms=terms: sum(s * (1.0 - T / Tc) ** n for s, n in terms),
            grid(low, min(high, 413.2), 10.0),
        )
    head = [
        "# source: Bell C. and contributors, the open-source library thermo 0.6.1, correlations "
        "labelled Fit 2023; the measurements behind them are not named there",
        "# seen: coefficients read from the library",
        "# uncertainty: not stated",
        EVALUATED,
    ]
    return Equations(head, found)


def _vapour() -> tuple[Equations, Equations]:
    mcgarry = {
        "acetone": (508.1, 4699930, -7.45514, 1.202, -2.43926, -3.3559, 259.0),
        "2-butanone": (536.78, 4221770, -7.71476, 1.71061, -3.6877, -0.751692, 255.0),
        "toluene": (591.72, 4106450, -7.28607, 1.38091, -2.83433, -2.79168, 309.0),
        "ethyl_acetate": (523.2, 3830100, -7.68521, 1.36511, -4.0898, -1.75342, 289.0),
        "n-heptane": (540.1, 2732370, -7.67468, 1.37068, -3.5362, -3.20243, 240.0),
    }
    first: list[list[str]] = []
    for liquid, (Tc, pc, a, b, c, d, low) in mcgarry.items():
        first += rows(
            liquid,
            "vapour_pressure",
            lambda T, Tc=Tc, pc=pc, k=(a, b, c, d): wagner(T, Tc, pc, k, (1.0, 1.5, 3.0, 6.0)),
            grid(low, 433.2),
        )
    antoine = {
        "acetone": (9.2184, 1197.01, -45.09, 247.38, 350.65),
        "2-butanone": (9.1386, 1232.63, -54.46, 265.62, 375.66),
        "toluene": (9.05043, 1327.62, -55.525, 286.44, 409.61),
        "n-dodecane": (9.12285, 1639.27, -91.31, 372.89, 520.24),
        "ethyl_acetate": (9.13361, 1195.13, -60.68, 265.5, 372.51),
        "n-heptane": (9.02023, 1263.909, -56.718, 277.71, 396.53),
    }
    second: list[list[str]] = []
    for liquid, (a, b, c, low, high) in antoine.items():
        second += rows(
            liquid, "vapour_pressure", lambda T, a=a, b=b, c=c: 10 ** (a - b / (T + c)),
            grid(low, high, 10.0),
        )  # fmt: skip
    return (
        Equations(
            ["# source: McGarry J., Ind. Eng. Chem. Process Des. Dev. 22 (1983) 313, Wagner "
             "constants", CHEMICALS, "# uncertainty: not stated in the copy", EVALUATED],
            first,
        ),
        Equations(
            ["# source: Poling B.E., Prausnitz J.M., O'Connell J.P., The Properties of Gases and "
             "Liquids, 5th ed. (2001), Antoine constants", CHEMICALS,
             "# uncertainty: not stated in the copy", EVALUATED],
            second,
        ),
    )  # fmt: skip


def _crc() -> Equations:
    # nD, T; heat capacity 298.15 K J/(mol K); heat of vaporisation at Tb and 298.15 K, J/mol
    table = {
        "acetone": (1.3588, 293.15, 126.3, 329.2, 29100, 30990),
        "2-butanone": (1.3788, 293.15, 158.7, 352.74, 31300, 34790),
        "ethyl_acetate": (1.3723, 293.15, 170.7, 350.26, 31940, 35600),
        "toluene": (1.4941, 298.15, 157.3, 383.78, 33180, 38010),
        "n-heptane": (1.3855, 298.15, 224.7, 371.55, 31770, 36570),
        "n-dodecane": (1.421, 293.15, 375.8, 489.47, 44090, 61520),
        "n-hexadecane": (1.4329, 298.15, 501.6, 560.01, 51840, 81350),
        "dimethyl_sulfoxide": (1.4793, 293.15, 153.0, 462.15, 43100, None),
    }
    found: list[list[str]] = []
    for liquid, (n, T, cp, boiling, at_boiling, at_room) in table.items():
        m = MOLAR_MASS[liquid]
        found.append([liquid, "refractive_index", f"{T}", f"{n}"])
        found.append([liquid, "heat_capacity", "298.15", f"{cp / m:.5g}"])
        found.append([liquid, "heat_of_vaporisation", f"{boiling}", f"{at_boiling / m:.5g}"])
        if at_room:
            found.append([liquid, "heat_of_vaporisation", "298.15", f"{at_room / m:.5g}"])
    head = [
        "# note: refractive index from the table Physical Constants of Organic Compounds; heat "
        "capacity and heat of vaporisation from the tables of that name, printed per mole, divided "
        "by the molar mass here; these copies do not name the edition",
        "# note: static permittivity: rows marked spot are printed values, rows marked equation "
        "evaluations of the printed polynomial",
    ]
    return Equations(head, found)


def _gaylord() -> Equations:
    liquid = "dimethyl_sulfoxide"
    found = [
        [liquid, "density", "298.15", "1095.5"],
        [liquid, "static_permittivity", "293.15", "48.9"],
        [liquid, "static_permittivity", "313.15", "45.5"],
        [liquid, "refractive_index", "298.15", "1.4768"],
        [liquid, "electrical_conductivity", "293.15", "3e-6"],
        [liquid, "heat_capacity", "298.15", "1966"],
        [liquid, "heat_of_vaporisation", "343.15", "605100"],
    ]
    head = [
        "# source: Gaylord Chemical, DMSO Physical Properties (maker's web page)",
        "# seen: the page itself, its table of typical properties",
        "# uncertainty: not stated",
        "# note: printed as 1.0955 g/cm3, 3e-8 per ohm and cm, 0.47 cal/(g degC), 11.3 kcal/mol",
    ]
    return Equations(head, found)


def _fuller() -> Equations:
    # volumes: 15.9 per C, 2.31 per H, as for the other alkanes of the table
    found: list[list[str]] = []
    for liquid, volume in (("n-dodecane", 250.86), ("n-hexadecane", 332.94)):
        m = 1000.0 * MOLAR_MASS[liquid]
        pair = math.sqrt(2.0 / (1.0 / m + 1.0 / 28.96))
        sizes = (volume ** (1 / 3) + 19.7 ** (1 / 3)) ** 2
        d = 0.00143e-4 * 298.15**1.75 / (1.01325 * pair * sizes)
        found.append([liquid, "diffusivity_in_air", "298.15", f"{d:.4g}"])
    return Equations(["# note: n-dodecane and n-hexadecane computed here the same way"], found)


def hexadecane_rows() -> dict[str, tuple[list[str], list[list[str]]]]:
    """Files of the reference equations of n-hexadecane, evaluated here."""
    liquid, T = "n-hexadecane", [291.33, *(293.15 + 10.0 * i for i in range(15))]
    seen = (
        "# seen: coefficients and the printed test values of the paper in the open-source program "
        "pychemqt; paper itself not seen"
    )
    romeo = (
        rows(liquid, "density", density, T)
        + rows(liquid, "heat_capacity", heat_capacity, T)
        + rows(liquid, "heat_of_vaporisation", heat_of_vaporisation, T)
        + rows(liquid, "speed_of_sound", speed_of_sound, T)
        + [[liquid, "vapour_pressure", "293.15", "0.1157"],
           [liquid, "vapour_pressure", "383.15", "182.8"],
           [liquid, "vapour_pressure", "473.15", "9779"]]
    )  # fmt: skip
    conductivity = [
        [liquid, "thermal_conductivity", f"{t:.2f}", f"{k:.5g}"]
        for t, k in ((300.0, 0.14352), (500.0, 0.11068))
    ]
    thermo = {293.15: 0.14474, 303.15: 0.14298, 323.15: 0.13947, 343.15: 0.13598,
              363.15: 0.13255, 383.15: 0.12916, 403.15: 0.12584, 423.15: 0.12258}  # fmt: skip
    conductivity += [
        [liquid, "thermal_conductivity", f"{t:.2f}", f"{k}"] for t, k in thermo.items()
    ]
    return {
        "Romeo2018": ([
            "# source: Romeo R., doctoral thesis, Politecnico di Torino (2018), equation of state "
            "of n-hexadecane", seen,
            "# uncertainty: not seen; taken as 0.1 % in density, 1 % in speed of sound and heat "
            "capacity",
            "# note: computed here at 101325 Pa; reproduces the printed 768.94 kg/m3 (300 K) and "
            "625.54 kg/m3 (500 K); vapour pressures are printed values (table 5 of Meng 2018)",
        ], romeo),
        "Meng2018": ([
            "# source: Meng X.Y., Sun Y.K., Cao F.L., Wu J.T., Vesovic V., J. Phys. Chem. Ref. "
            "Data 47 (2018) 033102, doi:10.1063/1.5039595",
            seen + "; abstract seen on a web page",
            "# uncertainty: 1 % (95 %) at atmospheric pressure, by its abstract",
            "# note: computed here with the density of Romeo2018; reproduces the printed "
            "2952.344 uPa s (300 K, 3.3958 mol/L) and 667.473 uPa s (400 K, 3.0865 mol/L)",
        ], rows(liquid, "viscosity", viscosity, T)),
        "Monogenidou2018": ([
            "# source: Monogenidou S.A., Assael M.J., Huber M.L., J. Phys. Chem. Ref. Data 47 "
            "(2018) 013103, doi:10.1063/1.5021459",
            seen + " (300 and 500 K); the other rows from the fit to it in the open-source library "
            "thermo 0.6.1",
            "# uncertainty: not seen; taken as 2 % (k = 1)",
        ], conductivity),
    }  # fmt: skip


EQUATIONS = {
    "PerryGreen2008": perry(),
    "VDIHeatAtlas2010": vdi(),
    "Zabransky1996": _zabransky(),
    "Mulero2012": _mulero(),
    "BellThermo2023": _bell(),
    "McGarry1983": _vapour()[0],
    "Poling2001": _vapour()[1],
    "CRCHandbook2014": _crc(),
    "Gaylord": _gaylord(),
    "Fuller1966": _fuller(),
}
