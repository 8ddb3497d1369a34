"""Values typed from what was seen, for `convert_oils.py`: handbook rows, tables, data sheets.

Every row is (liquid, property, temperature in degC, value as printed in SI, what it counts as).
The last entry goes to the column doi: a DOI, a citation, or the kind of row.
"""

from __future__ import annotations

from collections.abc import Sequence

__all__ = [
    "CAS", "CRC", "CRC_PERMITTIVITY", "FUELS", "OILS", "OIL_PAPERS", "PARTS", "TYPED", "Typed",
]  # fmt: skip

Typed = Sequence[tuple[str, str, float, str, str]]

CAS = {
    "limonene": "5989-27-5", "oleic_acid": "112-80-1", "methyl_oleate": "112-62-9",
    "methyl_palmitate": "112-39-0", "triolein": "122-32-7", "triacetin": "102-76-1",
    "dibutyl_phthalate": "84-74-2", "diethylhexyl_sebacate": "122-62-3",
    "squalane": "111-01-3", "hexanediol_diacrylate": "13048-33-4",
    "isobornyl_acrylate": "5888-33-5",
    "hexamethyldisiloxane": "107-46-0", "octamethyltrisiloxane": "107-51-7",
    "decamethyltetrasiloxane": "141-62-8", "dodecamethylpentasiloxane": "141-63-9",
    "octamethylcyclotetrasiloxane": "556-67-2", "decamethylcyclopentasiloxane": "541-02-6",
    "perfluorohexane": "355-42-0", "perfluoromethylcyclohexane": "355-02-2",
    "perfluorodecalin": "306-94-5", "perfluorooctane": "307-34-6",
    "perfluorotributylamine": "311-89-7", "methoxyperfluorobutane": "163702-07-6",
    "ethoxyperfluorobutane": "163702-05-4",
    "hfa-134a": "811-97-2", "hfa-227ea": "431-89-0", "hfa-152a": "75-37-6",
    "hfo-1234ze": "29118-24-9", "propane": "74-98-6", "n-butane": "106-97-8",
    "isobutane": "75-28-5", "dimethyl_ether": "115-10-6",
}  # fmt: skip

PARTS = {
    "oils": (
        "limonene", "oleic_acid", "methyl_oleate", "methyl_palmitate", "triolein", "triacetin",
        "dibutyl_phthalate", "diethylhexyl_sebacate", "squalane", "hexanediol_diacrylate",
        "isobornyl_acrylate",
    ),
    "siloxanes": (
        "hexamethyldisiloxane", "octamethyltrisiloxane", "decamethyltetrasiloxane",
        "dodecamethylpentasiloxane", "octamethylcyclotetrasiloxane",
        "decamethylcyclopentasiloxane",
    ),
    "fluorinated": (
        "perfluorohexane", "perfluoromethylcyclohexane", "perfluorodecalin", "perfluorooctane",
        "perfluorotributylamine", "methoxyperfluorobutane", "ethoxyperfluorobutane",
    ),
    "propellants": (
        "hfa-134a", "hfa-227ea", "hfa-152a", "hfo-1234ze", "propane", "n-butane", "isobutane",
        "dimethyl_ether",
    ),
}  # fmt: skip

# Density kg/m3 at degC; the copies append the printed superscript temperature to the digits.
CRC = {
    "limonene": (841.1, 20), "oleic_acid": (893.5, 20), "methyl_oleate": (873.9, 20),
    "methyl_palmitate": (824.7, 75), "triolein": (915, 15), "triacetin": (1158.3, 20),
    "dibutyl_phthalate": (1046.5, 20), "diethylhexyl_sebacate": (912, 25),
    "squalane": (811.5, 15), "hexanediol_diacrylate": (1010, 25),
    "hexamethyldisiloxane": (763.8, 20), "octamethyltrisiloxane": (820.0, 20),
    "decamethyltetrasiloxane": (853.6, 25), "dodecamethylpentasiloxane": (875.5, 20),
    "octamethylcyclotetrasiloxane": (956.1, 20), "decamethylcyclopentasiloxane": (959.3, 20),
    "perfluorohexane": (1691.0, 20), "perfluoromethylcyclohexane": (1787.8, 25),
    "perfluorodecalin": (1930.5, 25), "perfluorooctane": (1730, 20),
    "perfluorotributylamine": (1884, 25),
}  # fmt: skip

# Printed value with its temperature in K; polynomial in T with its range, where there is one.
CRC_PERMITTIVITY = {
    "limonene": (2.3746, 298.2), "oleic_acid": (2.336, 293.2), "methyl_oleate": (3.211, 293.2),
    "methyl_palmitate": (3.124, 313.2), "triolein": (3.109, 293.2), "triacetin": (7.11, 293.6),
    "dibutyl_phthalate": (6.58, 293.2), "squalane": (1.9106, 373.2),
    "hexamethyldisiloxane": (2.179, 293.2), "decamethyltetrasiloxane": (2.37, 293.2),
    "octamethylcyclotetrasiloxane": (2.39, 296.2), "decamethylcyclopentasiloxane": (2.5, 293.2),
    "perfluorohexane": (1.76, 298.2), "perfluoromethylcyclohexane": (1.82, 298.2),
    "perfluorotributylamine": (2.15, 293.2), "propane": (1.6678, 293.19),
    "n-butane": (1.7697, 295.0), "isobutane": (1.7518, 295.0), "dimethyl_ether": (6.18, 258.0),
}  # fmt: skip

_NOUREDDINI = "Noureddini1992"
_VISCOSITIES = "Noureddini1992"
_RYAN = "Ryan1984"
_MAGNE = "Magne1945"
_RESCORLA = "Rescorla1936"
_ACAROGLU = "Acaroglu2001"
_ALTIN = "Altin2001"
_LABECKAS = "Labeckas2006"
_LANG = "Lang1992"
_GOERING = "Goering1982"
_RADU = "Radu2001"

# Papers on vegetable oils, as the site that collects them cites them.
OIL_PAPERS = {
    _NOUREDDINI: "Noureddini H., Teoh B., Clements L.D., Densities (and Viscosities) of vegetable "
    "oils and fatty acids, J. Am. Oil Chem. Soc. 69 (1992) 1184-1188 and 1189-1191",
    _RYAN: "Ryan T.W., Dodge L.G., Callahan T.J., The effects of vegetable oil properties on "
    "injection and combustion in two different diesel engines, J. Am. Oil Chem. Soc. 61 (1984) "
    "1610-1619",
    _MAGNE: "Magne F.C., Skau E.L., Viscosities and Densities of Solvent-Vegetable Oil Mixtures, "
    "Ind. Eng. Chem. 37 (1945) 1097-1101",
    _RESCORLA: "Rescorla A.R., Carnahan F.L., Animal and Vegetable Oils, Viscosity-Temperature "
    "Characteristics, Ind. Eng. Chem. 28 (1936) 1212-1213",
    _ACAROGLU: "Acaroglu M., Oguz H., Ogut H., An investigation of the use of rapeseed oil in "
    "agricultural tractors as engine oil, Energy Sources 23 (2001) 823-830",
    _ALTIN: "Altin R., Cetinkaya S., Yucesu H.S., The potential of using vegetable oil fuels as "
    "fuel for diesel engines, Energy Convers. Manage. 42 (2001) 529-538",
    _LABECKAS: "Labeckas G., Slavinskas S., Performance of direct-injection off-road diesel "
    "engine on rapeseed oil, Renewable Energy 31 (2006) 849-863",
    _LANG: "Lang W., Sokhansanj S., Sosulski F.W., Modelling the Temperature Dependence of "
    "Kinematic Viscosity for Refined Canola Oil, J. Am. Oil Chem. Soc. 69 (1992) 1054",
    _GOERING: "Goering (1982), named without title in a table of fuel properties",
    _RADU: "Radu (2001), named without title in a table of fuel properties",
}

# Vegetable oils: density kg/m3, kinematic viscosity mm2/s, surface tension mN/m, as printed.
_DENSITY_T = (23.9, 37.8, 48.9, 60.0, 82.2, 100.0, 110.0)
_DENSITIES = {
    "rapeseed_oil": ("907.3", "898.7", "890.8", "883.9", "868.6", "857.9", "851.1"),
    "soybean_oil": ("919.3", "908.2", "902.3", "893.9", "879.5", "867.4", "861.5"),
}
OILS: Typed = [
    *((oil, "density", T, value, _NOUREDDINI) for oil, values in _DENSITIES.items()
      for T, value in zip(_DENSITY_T, values, strict=True)),
    *(("rapeseed_oil", "kinematic_viscosity", T, value, _VISCOSITIES) for T, value in
      ((23.9, "87"), (38, "50"), (48.9, "34"), (60, "24"), (82.2, "14"), (100, "9"), (110, "8"))),
    *(("soybean_oil", "kinematic_viscosity", T, value, _VISCOSITIES) for T, value in
      ((23.9, "59"), (38, "35"), (48.9, "26"), (60, "18"), (82.2, "11"), (100, "8"), (110, "7"))),
    ("rapeseed_oil", "kinematic_viscosity", 20, "76", _ACAROGLU),
    ("rapeseed_oil", "kinematic_viscosity", 30, "48", _ACAROGLU),
    ("rapeseed_oil", "kinematic_viscosity", 40, "34", _ACAROGLU),
    ("rapeseed_oil", "kinematic_viscosity", 50, "24", _ACAROGLU),
    ("rapeseed_oil", "kinematic_viscosity", 60, "16", _ACAROGLU),
    ("rapeseed_oil", "kinematic_viscosity", 70, "13", _ACAROGLU),
    ("rapeseed_oil", "kinematic_viscosity", 80, "11", _ACAROGLU),
    ("rapeseed_oil", "kinematic_viscosity", 4, "178.9", _LANG),
    ("rapeseed_oil", "kinematic_viscosity", 10, "128.8", _LANG),
    ("rapeseed_oil", "kinematic_viscosity", 25, "63", _LANG),
    ("rapeseed_oil", "kinematic_viscosity", 40, "37", _LANG),
    ("rapeseed_oil", "kinematic_viscosity", 40, "38", _LABECKAS),
    ("rapeseed_oil", "kinematic_viscosity", 60, "20", _LABECKAS),
    ("rapeseed_oil", "kinematic_viscosity", 38, "37", _GOERING),
    ("rapeseed_oil", "kinematic_viscosity", 38, "51", _RESCORLA),
    ("rapeseed_oil", "density", 15.6, "911.5", _GOERING),
    ("rapeseed_oil", "density", 15.6, "914", _ALTIN),
    ("rapeseed_oil", "density", 15.6, "916", _LABECKAS),
    ("soybean_oil", "kinematic_viscosity", 0, "184.9", _MAGNE),
    ("soybean_oil", "kinematic_viscosity", 10, "107.5", _MAGNE),
    ("soybean_oil", "kinematic_viscosity", 25, "55", _MAGNE),
    ("soybean_oil", "kinematic_viscosity", 40, "32", _MAGNE),
    ("soybean_oil", "kinematic_viscosity", 20, "64", _RYAN),
    ("soybean_oil", "kinematic_viscosity", 40, "31", _RYAN),
    ("soybean_oil", "kinematic_viscosity", 100, "7", _RYAN),
    ("soybean_oil", "kinematic_viscosity", 38, "32.6", _GOERING),
    ("soybean_oil", "density", 15.6, "913.8", _GOERING),
    ("soybean_oil", "density", 15.6, "908.78", _RYAN),
    ("soybean_oil", "surface_tension", 25, "32.13", _RYAN),
    ("sunflower_oil", "kinematic_viscosity", 20, "65", _RYAN),
    ("sunflower_oil", "kinematic_viscosity", 40, "31", _RYAN),
    ("sunflower_oil", "kinematic_viscosity", 100, "8", _RYAN),
    ("sunflower_oil", "kinematic_viscosity", 38, "33.9", _GOERING),
    ("sunflower_oil", "kinematic_viscosity", 38, "33", _RESCORLA),
    ("sunflower_oil", "kinematic_viscosity", 99, "8", _RESCORLA),
    ("sunflower_oil", "density", 15.6, "916.1", _GOERING),
    ("sunflower_oil", "density", 15.6, "918", _ALTIN),
    ("sunflower_oil", "density", 15.6, "907.85", _RYAN),
    ("sunflower_oil", "surface_tension", 25, "32.82", _RYAN),
    ("sunflower_oil", "surface_tension", 25, "32.1", _RADU),
    ("olive_oil", "kinematic_viscosity", 38, "47", _RESCORLA),
    ("olive_oil", "kinematic_viscosity", 99, "9", _RESCORLA),
    ("castor_oil", "kinematic_viscosity", 38, "293", _RESCORLA),
    ("castor_oil", "kinematic_viscosity", 99, "20", _RESCORLA),
    ("castor_oil", "kinematic_viscosity", 38, "297", _GOERING),
    ("castor_oil", "density", 15.6, "953.7", _GOERING),
]  # fmt: skip

# Three jet fuels of one programme; density kg/m3, kinematic viscosity mm2/s, N/m, Pa.
_JET = {
    "Jet A POSF10325": (
        ("density", ((-40, "843.87"), (-20, "829.68"), (0, "815.12"), (20, "801.7"),
                     (40, "787.33"))),
        ("kinematic_viscosity", ((-40, "9.2"), (-20, "4.5"), (40, "1.31"), (100, "0.68"))),
        ("surface_tension", ((-10, "28.028"), (20, "24.819"), (40, "23.620"))),
    ),
    "JP-8 POSF10264": (
        ("density", ((-40.11, "822.98"), (-20.33, "808.6"), (0.08, "794.23"), (20.18, "779.85"),
                     (40.27, "765.28"))),
        ("kinematic_viscosity", ((-40, "6.6"), (-20, "3.5"), (40, "1.14"), (100, "0.61"))),
    ),
    "JP-5 POSF10289": (
        ("density", ((0.08, "838.69"), (20.18, "823.93"), (39.95, "809.75"))),
        ("kinematic_viscosity", ((-40, "14.1"), (-20, "6.5"), (40, "1.57"), (100, "0.76"))),
    ),
}  # fmt: skip
FUELS: Typed = [
    ("jet_fuel", prop, T, value, fuel)
    for fuel, blocks in _JET.items() for prop, rows in blocks for T, value in rows
]  # fmt: skip

_RAUSCH_T = tuple(range(0, 101, 10))
_RAUSCH = {
    "density": ("1478.07", "1456.13", "1433.91", "1411.31", "1388.26", "1364.68", "1340.47",
                "1315.57", "1289.87", "1263.31", "1235.79"),
    "kinematic_viscosity": ("0.6631", "0.5563", "0.4824", "0.4292", "0.3822", "0.3429",
                            "0.3125", "0.2826", "0.2564", "0.2382", "0.2225"),
    "surface_tension": ("16.03", "14.9", "14.01", "13.21", "12.33", "11.42", "10.56", "9.67",
                        "8.84", "7.99", "7.19"),
}  # fmt: skip

# Files of typed values: name of the file, comment lines, rows.
TYPED: dict[str, tuple[Sequence[str], Typed]] = {
    "Rausch2015_fluorinated": (
        ["# source: Rausch M.H., Kretschmer L., Will S., Leipertz A., Froeba A.P., Density, "
         "Surface Tension, and Kinematic Viscosity of Hydrofluoroethers HFE-7000, HFE-7100, "
         "HFE-7200, HFE-7300, and HFE-7500, J. Chem. Eng. Data 60 (2015) 3759-3765",
         "# seen: its table for HFE-7200 transcribed in a public program; abstract seen on a web "
         "page; paper itself not seen",
         "# uncertainty: density 0.02 % (95 %, abstract); viscosity and surface tension by surface "
         "light scattering, taken as 2 and 1.5 % (95 %)",
         "# note: viscosity = kinematic viscosity times density of the same table, formed here"],
        [("ethoxyperfluorobutane", prop, T, value, "10.1021/acs.jced.5b00691")
         for prop, values in _RAUSCH.items()
         for T, value in zip(_RAUSCH_T, values, strict=True)],
    ),
    "Warrier2011_fluorinated": (
        ["# source: Warrier P., Teja A.S., Density, Viscosity, and Thermal Conductivity of "
         "Mixtures of 1-Ethoxy-1,1,2,2,3,3,4,4,4-nonafluorobutane (HFE 7200) with Methanol and "
         "1-Ethoxybutane, J. Chem. Eng. Data 56 (2011)",
         "# seen: five values transcribed in a public program; paper itself not seen",
         "# uncertainty: not stated in the copy; taken as 2 %"],
        [("ethoxyperfluorobutane", "thermal_conductivity", T, value, "") for T, value in
         ((5.65, "0.0712"), (27.45, "0.0644"), (40.95, "0.0616"), (55.15, "0.059"),
          (70.95, "0.0563"))],
    ),
    "HydrofluoroetherSheets_fluorinated": (
        ["# source: values of the makers' product information for hydrofluoroethers, as public "
         "programs for cooling carry them",
         "# seen: a table of liquids in a battery model (1510 kg/m3, 0.58 mPa s, 1183 J/(kg K), "
         "0.069 W/(m K) for methoxyperfluorobutane; 1430 kg/m3, 0.61 mPa s for the ethoxy ether), "
         "another of coolants (13.6 mN/m for both), and a third (heat of vaporisation 30 cal/g, heat capacity 0.29 cal/(g K), "
         "109 mmHg at 25 degC for the ethoxy ether)",
         "# uncertainty: not stated; typical values of a maker"],
        [("methoxyperfluorobutane", "density", 25, "1510", "sheet"),
         ("methoxyperfluorobutane", "viscosity", 25, "0.00058", "sheet"),
         ("methoxyperfluorobutane", "heat_capacity", 25, "1183", "sheet"),
         ("methoxyperfluorobutane", "thermal_conductivity", 25, "0.069", "sheet"),
         ("methoxyperfluorobutane", "surface_tension", 25, "0.0136", "sheet"),
         ("ethoxyperfluorobutane", "surface_tension", 25, "0.0136", "sheet"),
         ("ethoxyperfluorobutane", "density", 25, "1430", "sheet"),
         ("ethoxyperfluorobutane", "viscosity", 25, "0.00061", "sheet"),
         ("ethoxyperfluorobutane", "heat_capacity", 25, "1214", "sheet"),
         ("ethoxyperfluorobutane", "thermal_conductivity", 25, "0.0616", "sheet"),
         ("ethoxyperfluorobutane", "vapour_pressure", 25, "14532", "sheet"),
         ("ethoxyperfluorobutane", "heat_of_vaporisation", 25, "125604", "sheet")],
    ),
    "Ji2021_siloxanes": (
        ["# source: Ji B., Yang Z., Feng J., Compound jetting from bubble bursting at an "
         "air-oil-water interface, Nat. Commun. 12 (2021) 6305, table of liquids",
         "# seen: the table copied into the comments of a public program; paper itself not seen",
         "# uncertainty: surface tension 0.1 to 0.7 mN/m as printed; densities and viscosities "
         "are the maker's nominal values; temperature not in the copy, taken as 25 degC"],
        [row for grade, rho, eta, sigma in
         (("5", "913", "0.0046", "18.7"), ("20", "950", "0.019", "19.4"),
          ("100", "960", "0.096", "20.1"), ("500", "970", "0.465", "19.9"),
          ("1000", "970", "0.970", "21.7")) for row in
         ((f"polydimethylsiloxane_{grade}", "density", 25.0, rho, "10.1038/s41467-021-26382-w"),
          (f"polydimethylsiloxane_{grade}", "viscosity", 25.0, eta, "10.1038/s41467-021-26382-w"),
          (f"polydimethylsiloxane_{grade}", "surface_tension", 25.0, sigma,
           "10.1038/s41467-021-26382-w"))],
    ),
    "DropImpact2019_siloxanes": (
        ["# source: article on drop impact, J. Fluid Mech. (2019), doi 10.1017/jfm.2019.141, "
         "table 1, as a comment of a public program names it; authors not given there",
         "# seen: the table in the comments of that program; paper itself not seen",
         "# uncertainty: not in the copy; temperature not in the copy, taken as 25 degC"],
        [("polydimethylsiloxane_20", "density", 25, "950", "10.1017/jfm.2019.141"),
         ("polydimethylsiloxane_20", "surface_tension", 25, "18.9", "10.1017/jfm.2019.141"),
         ("polydimethylsiloxane_100", "density", 25, "960", "10.1017/jfm.2019.141"),
         ("polydimethylsiloxane_100", "surface_tension", 25, "21.1", "10.1017/jfm.2019.141")],
    ),
    "SiliconePrograms_siloxanes": (
        ["# source: constants of polydimethylsiloxane oils in public programs and data files: a "
         "heat-transfer model (5 mm2/s), two studies of drops on baths (5 and 20 mm2/s), a study "
         "of sliding drops (10 and 50 mm2/s), a microchannel simulation (50 mm2/s), a note on a "
         "heat-transfer fluid (9.8 mm2/s), a price list (350 mm2/s)",
         "# seen: the programs and files; what they copied (makers' data sheets, mostly) not seen",
         "# uncertainty: not stated; grades are sold to 5 to 10 % in viscosity",
         "# note: where a temperature was not given, 25 degC, at which the grades are named"],
        [("polydimethylsiloxane_5", "density", 25, "918", "heat-transfer model"),
         ("polydimethylsiloxane_5", "surface_tension", 25, "20.5", "drops on baths, 2026"),
         ("polydimethylsiloxane_10", "density", 25, "935", "heat-transfer fluid"),
         ("polydimethylsiloxane_10", "surface_tension", 25, "21", "sliding drops"),
         ("polydimethylsiloxane_20", "density", 25, "949", "drops on baths, 20 mm2/s"),
         ("polydimethylsiloxane_20", "surface_tension", 25, "20.6", "drops on baths, 20 mm2/s"),
         ("polydimethylsiloxane_50", "density", 25, "960", "microchannel simulation"),
         ("polydimethylsiloxane_50", "surface_tension", 25, "21", "sliding drops"),
         ("polydimethylsiloxane_350", "density", 25, "970", "price list")],
    ),
    "PipingTable_oils": (
        ["# source: table of liquids in a public program for piping calculations; its origin is "
         "not given there",
         "# seen: the program's table",
         "# uncertainty: not stated; two to three figures",
         "# note: viscosity = kinematic viscosity times density of the same row, formed here"],
        [row for oil, T, nu, rho in
         (("castor_oil", 20.0, "1017", "960"), ("castor_oil", 30.0, "580", "955"),
          ("castor_oil", 40.0, "315", "950"), ("castor_oil", 50.0, "200", "945"),
          ("castor_oil", 60.0, "115", "940"), ("soybean_oil", 20.0, "75", "926"),
          ("olive_oil", 20.0, "91.5", "910"), ("rapeseed_oil", 20.0, "178", "920")) for row in
         ((oil, "density", T, rho, ""), (oil, "kinematic_viscosity", T, nu, ""))],
    ),
    "ViscosityEssay_oils": (
        ["# source: table of viscosities on a web page (essay), origin not given there",
         "# seen: the page (excerpt)",
         "# uncertainty: not stated",
         "# note: temperature not printed; its water (1.002 mPa s) is that of 20 degC"],
        [("castor_oil", "viscosity", 20, "0.986", ""), ("olive_oil", "viscosity", 20, "0.084", "")],
    ),
    "AcrylateSheets_oils": (
        ["# source: makers' and encyclopaedia pages on isobornyl acrylate: product table of one "
         "maker, and the German encyclopaedia page Isobornylacrylat",
         "# seen: the pages themselves (excerpts)",
         "# uncertainty: not stated"],
        [("isobornyl_acrylate", "density", 25, "984", "maker"),
         ("isobornyl_acrylate", "viscosity", 25, "0.0075", "maker"),
         ("isobornyl_acrylate", "refractive_index", 25, "1.504", "maker"),
         ("isobornyl_acrylate", "density", 25, "986", "encyclopaedia"),
         ("isobornyl_acrylate", "refractive_index", 20, "1.476", "encyclopaedia")],
    ),
}  # fmt: skip
