"""How large the data are that travel with the package."""

from __future__ import annotations

from collections import Counter

from dropkit import records

# Bytes. A wheel holds the data folder without data/build, as pyproject.toml says.
MOST = 3_000_000


def test_the_installed_data_stay_below_three_megabytes() -> None:
    root = records.data_dir()
    sizes: Counter[str] = Counter()
    for path in root.rglob("*"):
        place = path.relative_to(root).parts
        if path.is_file() and place[0] != "build":
            sizes["/".join(place[:-1]) or place[0]] += path.stat().st_size
    assert sizes["liquids"] > 0
    assert sizes.total() < MOST, f"{sizes.total()} bytes: {dict(sizes.most_common(6))}"
