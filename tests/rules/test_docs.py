"""The README's and the docs' code runs and prints what stands below it; their links lead somewhere.

A ```python block runs as it would in a notebook: the pages' blocks share one namespace, and the
value of a last line that is an expression is shown. A ```text block that follows at once is its
output: words must be the same, numbers equal to the digits printed, ``...`` stands for anything.
"""

from __future__ import annotations

import ast
import contextlib
import io
import os
import re
from collections.abc import Iterator
from dataclasses import dataclass
from pathlib import Path
from typing import Any

import pytest

ROOT = Path(__file__).parents[2]
PAGES = [ROOT / "README.md", ROOT / "DEVELOPERS.md", *sorted((ROOT / "docs").rglob("*.md"))]
NAMES = [page.relative_to(ROOT).as_posix() for page in PAGES]

FENCE = re.compile(r"^```(\w*)[^\n]*\n(.*?)^```\s*$", re.MULTILINE | re.DOTALL)
NUMBER = re.compile(r"[-+]?(?:\d+\.?\d*|\.\d+)(?:[eE][-+]?\d+)?")


@dataclass(frozen=True)
class Block:
    """One fenced block: its language, text, first line and what separates it from the last one."""

    language: str
    text: str
    line: int
    follows_at_once: bool


def blocks(page: Path) -> list[Block]:
    """The fenced blocks of a page, in order."""
    text = page.read_text(encoding="utf-8")
    found, end = [], 0
    for match in FENCE.finditer(text):
        line = text.count("\n", 0, match.start()) + 2
        at_once = not text[end : match.start()].strip()
        found.append(Block(match[1], match[2], line, at_once))
        end = match.end()
    return found


def run(block: Block, page: str, namespace: dict[str, Any]) -> str:
    """What a block prints, with the value of its last expression as a notebook shows it."""
    # Lines of a traceback are then lines of the page.
    tree = ast.parse("\n" * (block.line - 1) + block.text, filename=page)
    last = tree.body.pop() if tree.body and isinstance(tree.body[-1], ast.Expr) else None
    printed = io.StringIO()
    with contextlib.redirect_stdout(printed):
        exec(compile(tree, page, "exec"), namespace)
        if last is not None:
            value = eval(compile(ast.Expression(last.value), page, "eval"), namespace)
            if value is not None:
                print(repr(value))
    return printed.getvalue()


def agree(expected: str, got: str) -> bool:
    """Whether a printed number agrees with another to the digits that the first one shows."""
    digits = expected.lower().partition("e")[0].partition(".")[2]
    exponent = int(expected.lower().partition("e")[2] or 0)
    step = 10.0 ** (exponent - len(digits))
    if not digits:  # an integer that stands for a rounded number, such as 3300
        step *= 10.0 ** (len(expected) - len(expected.rstrip("0")))
    return abs(float(expected) - float(got)) <= step * (1 + 1e-9)


def matches(expected: str, got: str) -> bool:
    """Whether one line of output is the other, spaces aside and numbers to the digits printed."""
    expected, got = " ".join(expected.split()), " ".join(got.split())
    numbers, others = NUMBER.findall(expected), []
    pattern = re.escape(NUMBER.sub("\0", expected)).replace(re.escape("\0"), "\0")
    pattern = pattern.replace(re.escape("..."), ".*").replace("\0", f"({NUMBER.pattern})")
    if found := re.fullmatch(pattern, got):
        others = list(found.groups())
    return len(others) == len(numbers) and all(map(agree, numbers, others))


def pairs(page: Path) -> Iterator[tuple[Block, Block | None]]:
    """The Python blocks of a page, each with the output that follows it at once."""
    found = blocks(page)
    for block, after in zip(found, [*found[1:], None], strict=False):
        if block.language == "python":
            shown = after if after and after.language == "text" and after.follows_at_once else None
            yield block, shown


@pytest.mark.parametrize("name", NAMES)
def test_code_blocks_run_and_print_what_is_shown(
    name: str, tmp_path: Path, monkeypatch: pytest.MonkeyPatch
) -> None:
    monkeypatch.chdir(tmp_path)
    namespace: dict[str, Any] = {"__name__": "__docs__"}
    for block, shown in pairs(ROOT / name):
        printed = run(block, name, namespace)
        if shown is not None:
            expected = [line for line in shown.text.splitlines() if line.strip()]
            got = [line for line in printed.splitlines() if line.strip()]
            for i, line in enumerate(expected):
                if line.strip() == "...":  # the rest is left out
                    break
                assert i < len(got), f"{name}:{shown.line + i} is not printed: {line}"
                assert matches(line, got[i]), (
                    f"{name}:{shown.line + i}\nshown   {line}\nprinted {got[i]}"
                )
            else:
                assert len(got) == len(expected), (
                    f"{name}:{shown.line}: more is printed:\n{printed}"
                )


@pytest.mark.parametrize("name", NAMES)
def test_blocks_name_a_known_language(name: str) -> None:
    for block in blocks(ROOT / name):
        assert block.language in {"python", "text", "sh", "toml", "csv", "bat"}, (
            f"{name}:{block.line}: say what the block is; only python is run"
        )


@pytest.mark.parametrize("name", NAMES)
def test_links_and_pictures_exist(name: str) -> None:
    page = ROOT / name
    text = FENCE.sub("", page.read_text(encoding="utf-8"))
    for target in re.findall(r"\]\(([^)\s]+)\)", text):
        if not re.match(r"[a-z]+:|#", target):
            path = (page.parent / target.partition("#")[0]).resolve()
            assert path.exists(), f"{name} links to {target}"
            assert path.is_relative_to(ROOT), f"{name} links out of the checkout: {target}"


def test_the_outputs_comparison_itself() -> None:
    assert matches("viscosity  2.36 mPa*s", "viscosity 2.359 mPa*s")
    assert not matches("viscosity  2.36 mPa*s", "viscosity 2.339 mPa*s")
    assert not matches("viscosity  2.36 mPa*s", "viscosity 2.36 Pa*s")
    assert matches("rate 3300 ... 1/s", "rate 3312 per nozzle, 1/s")
    assert matches("1.2e-05", "1.21e-05")
    assert not matches("1.2e-05", "1.2e-04")


# ------------------------------------------------ the README's two commands
def commands(ending: str) -> list[str]:
    """The README's lines for a fresh POSIX machine that end in a pattern."""
    lines = [
        line
        for b in blocks(ROOT / "README.md")
        if b.language == "sh"
        for line in b.text.splitlines()
    ]
    return [line for line in lines if re.search(rf"^python3 -m venv .*{ending}$", line)]


def test_the_readme_has_two_commands_that_set_up_everything() -> None:
    for ending in (r" -m pytest -n auto", r" examples/[a-z_]*\.py"):
        (command,) = commands(ending)
        assert command.startswith(
            "python3 -m venv .venv && .venv/bin/pip install -q -e '.[plots,test]' && "
        )
    (job,) = commands(r"\.py")
    assert (ROOT / job.split()[-1]).is_file()


def test_windows_lines_mirror_the_posix_ones() -> None:
    readme = blocks(ROOT / "README.md")
    posix = [line for b in readme if b.language == "sh" for line in b.text.splitlines()]
    windows = [line for b in readme if b.language == "bat" for line in b.text.splitlines()]
    translated = [
        # Without a number `py` takes the newest Python that it finds, also one that is refused.
        line.replace("python3 -m venv", "py -3.13 -m venv")
        .replace(".venv/bin/", ".venv\\Scripts\\")
        .replace("examples/", "examples\\")
        .replace("'", '"')
        for line in posix
    ]
    assert windows == translated


def test_nothing_is_installed_by_its_name_from_an_index() -> None:
    # Whoever holds the name there may be a stranger.
    for page in PAGES:
        for line in page.read_text(encoding="utf-8").splitlines():
            assert not re.search(r"pip\S* install(?: -\S+)* [\"']?dropkit\b", line), (
                f"{page}: {line}"
            )


def test_ci_runs_the_readmes_test_command() -> None:
    script = (ROOT / ".ci" / "run").read_text(encoding="utf-8")
    code = [line for line in script.splitlines() if not line.lstrip().startswith("#")]
    # The command is taken from the README; nothing else in the script starts the tests.
    assert [line for line in code if "pytest" in line] == [
        "test_command=$(readme_line ' -m pytest -n auto')"
    ]
    (command,) = commands(" -m pytest -n auto")
    assert os.environ.get("DROPKIT_TEST_COMMAND", command) == command
