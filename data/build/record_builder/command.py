"""The command: specs in, records and residuals out, then the seal."""

from __future__ import annotations

import csv
import importlib.metadata
import importlib.util
import platform
import subprocess
import sys
import tomllib
from collections.abc import Mapping, Sequence
from pathlib import Path
from typing import Any

from dropkit.record_types import INTERFACIAL
from record_builder import BuildError
from record_builder.blocks import Built, build_block
from record_builder.points import Published
from record_builder.statistics import Deviation
from record_builder.subjects import Interface, Liquid, Pair, Subject
from record_builder.toml_out import dumps

__all__ = ["PROPERTIES", "build_record", "main"]

PROPERTIES = (
    *("density", "viscosity", "surface_tension", "vapour_pressure", "heat_of_vaporisation"),
    *("heat_capacity", "thermal_conductivity", "static_permittivity", "speed_of_sound"),
    *("diffusivity_in_air", "refractive_index", "electrical_conductivity"),
    INTERFACIAL,
)
# What a record says by leaving it out.
_BY_SILENCE = {"kind": "liquid", "amphiphile": False, "synonyms": [], "cautions": []}
_HEADER = "Built from its spec: edit that, not this."


# A bare pair is a mixture; two liquids in contact are named with their folder.
_CONTACT = "interfaces/"


def _folder(name: str) -> str:
    if name.startswith(_CONTACT):
        return "interfaces"
    return "mixtures" if "__" in name else "liquids"


def _subject(name: str, spec: Mapping[str, Any], data: Path) -> Subject:
    folder = _folder(name)
    if folder == "liquids":
        return Liquid(name, spec)
    components = spec.get("components", [])
    if "__".join(components) != name.removeprefix(_CONTACT):
        raise BuildError(f"{name}: components do not make that name")
    if folder == "mixtures":
        return Pair(name, spec, data / "liquids")
    for key in components:
        if not (data / "liquids" / f"{key}.toml").exists():
            raise BuildError(f"{name}: {key} has no record yet; build the liquid before")
    return Interface(name, spec)


def build_record(name: str, data: Path) -> list[str]:
    """Build one record and its residuals; the problems found, empty if it was written.

    Nothing is written unless every block of the spec stands.
    """
    folder = _folder(name)
    stem = name.removeprefix(_CONTACT)
    path = data / "build" / "specs" / folder / f"{stem}.toml"
    if not path.exists():
        return [f"{name}: there is no spec {path.relative_to(data)}"]
    with path.open("rb") as handle:
        spec = tomllib.load(handle)
    published = Published(data / "published")
    blocks: dict[str, list[Built]] = {}
    problems = []
    try:
        subject = _subject(name, spec, data)
        for prop in PROPERTIES:
            for block in spec.get(prop, []):
                try:
                    built = build_block(subject, prop, block, published)
                    blocks.setdefault(prop, []).append(built)
                except BuildError as error:
                    problems.append(str(error))
    except BuildError as error:
        problems.append(str(error))
    if problems:
        return problems
    record = {
        key: value
        for key, value in spec.items()
        if key not in PROPERTIES and not (key in _BY_SILENCE and value == _BY_SILENCE[key])
    }
    for prop, built_blocks in blocks.items():
        record[prop] = [built.record for built in built_blocks]
    target = data / folder / f"{stem}.toml"
    target.write_text(dumps(record, _HEADER), encoding="utf-8")
    _report(name, blocks, data)
    return []


def _report(name: str, blocks: Mapping[str, list[Built]], data: Path) -> None:
    folder = data / "build" / "residuals"
    (folder / f"{name}.csv").parent.mkdir(parents=True, exist_ok=True)
    with (folder / f"{name}.csv").open("w", encoding="utf-8", newline="") as handle:
        writer = csv.writer(handle, lineterminator="\n")
        header = "property,block,source,T_K,mass_fraction_1,value,fitted,deviation_percent,role"
        writer.writerow([*header.split(","), "reason"])
        for prop, built_blocks in blocks.items():
            for number, built in enumerate(built_blocks, start=1):
                for deviation in built.deviations:
                    writer.writerow([prop, number, *_row(deviation)])
    versions = {"python": platform.python_version()}
    for package in ("numpy", "scipy", "CoolProp"):
        versions[package] = importlib.metadata.version(package)
    report: dict[str, Any] = {"versions": versions}
    for prop, built_blocks in blocks.items():
        report[prop] = [built.report for built in built_blocks]
    (folder / f"{name}.toml").write_text(
        dumps(report, "Deviations are relative, fitted against published."), encoding="utf-8"
    )


def _row(deviation: Deviation) -> list[str]:
    point = deviation.point
    fraction = "" if point.fraction != point.fraction else f"{point.fraction:.6g}"
    return [
        point.source,
        f"{point.temperature:.8g}",
        fraction,
        f"{point.value:.8g}",
        f"{deviation.fitted:.8g}",
        f"{100 * deviation.relative:.4f}",
        deviation.role,
        point.excluded,
    ]


def _names(data: Path) -> list[str]:
    specs = data / "build" / "specs"
    return [
        (_CONTACT if folder == "interfaces" else "") + path.stem
        for folder in ("liquids", "mixtures", "interfaces")
        for path in sorted((specs / folder).glob("*.toml"))
    ]


def _lines(name: str, data: Path) -> list[str]:
    with (data / "build" / "residuals" / f"{name}.toml").open("rb") as handle:
        report = tomllib.load(handle)
    lines = []
    for prop, blocks in report.items():
        if prop == "versions":
            continue
        for block in blocks:
            parts = [f"  {prop}: {block['grade']}, u = {100 * block['uncertainty']:.3g} %"]
            for role in ("fit", "left_out", "second"):
                if role in block:
                    found = block[role]
                    parts.append(
                        f"{role} {found['points']} points, median {100 * found['median']:.3g}, "
                        f"95 % {100 * found['p95']:.3g}, worst {100 * found['worst']:.3g} %"
                    )
            if block["disagreement"]:
                parts.append(block["disagreement"])
            lines.append("; ".join(parts))
    return lines


def main(arguments: Sequence[str], data: Path) -> int:
    """Build the named specs, or all of them; the exit code."""
    names = list(arguments) or _names(data)
    # A pair needs its finished ends.
    names.sort(key=lambda name: "__" in name)
    failed = False
    written = []
    for name in names:
        problems = build_record(name, data)
        if problems:
            failed = True
            print(f"{name}: NOT WRITTEN")
            print("\n".join(f"  {problem}" for problem in problems))
        else:
            written.append(f"{_folder(name)}/{name.removeprefix(_CONTACT)}")
            print(f"{name}: written")
            print("\n".join(_lines(name, data)))
    if written and importlib.util.find_spec("dropkit.records") is not None:
        from dropkit.records import data_dir

        if data_dir().resolve() == data.resolve():
            command = [sys.executable, "-m", "dropkit.records", "seal", *written]
            return subprocess.run(command, check=False).returncode or int(failed)
    return int(failed)
