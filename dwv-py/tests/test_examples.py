"""The examples run, and say and write what they should."""

from __future__ import annotations

import os
import runpy
import subprocess
import sys
from pathlib import Path
from typing import get_args

import dwv
import pytest

EXAMPLES = Path(__file__).parents[2] / "python-examples"
UTF8 = {**os.environ, "PYTHONUTF8": "1"}


def run(example: str, *arguments: str) -> str:
    command = [sys.executable, "-W", "error", str(EXAMPLES / example), *arguments]
    return subprocess.run(command, check=True, capture_output=True, encoding="utf-8", env=UTF8, timeout=60).stdout


def test_the_house_drawn_in_python_is_the_house_of_the_file() -> None:
    drawn = runpy.run_path(str(EXAMPLES / "build_house.py"))["draw"]()
    file = dwv.Layout.from_file(EXAMPLES / "house.layout.json")
    assert drawn == file
    assert drawn.to_json() == file.to_json()


def test_the_house_is_sized_printed_and_written(tmp_path: Path) -> None:
    said = run("build_house.py", str(tmp_path / "house"))
    sizing = dwv.size(EXAMPLES / "house.layout.json")
    assert said.startswith(sizing.to_text())
    expected = {"house.layout.json": sizing.layout.to_json(), "house.sizing.json": sizing.to_json()}
    expected["house.txt"] = sizing.to_text()
    for name in get_args(dwv.ScheduleName):
        expected[f"house.{name}.csv"] = sizing.schedule(name).to_csv()
    written = {path.name: path.read_bytes().decode() for path in (tmp_path / "house").iterdir()}
    assert written == expected
    for name in expected:
        assert f"wrote {tmp_path / 'house' / name}" in said


def test_takeoff_cells_answer() -> None:
    """NPC 2015 Table 2.5.7.1. for the vent; 3.8 m at 1:50 is 76 mm, worked out by hand."""
    said = run("takeoff_cells.py")
    assert "largest trap     2 in: least vent 1-1/2 in" in said
    assert "a run of 3.8 m at 1:50 falls 0.076 m" in said
    assert "licensed practitioner" in said


def test_layouts_are_checked_and_one_bad_file_does_not_stop_the_others(tmp_path: Path) -> None:
    house = EXAMPLES / "house.layout.json"
    text = dwv.Layout.from_file(house).to_json()
    (tmp_path / "bad.layout.json").write_text(text.replace('"through": "roof"', '"thru": "roof"'), encoding="utf-8")
    low = text.replace('"above": "300 mm"', '"above": "50 mm"')
    (tmp_path / "low.layout.json").write_text(low, encoding="utf-8")
    example = str(EXAMPLES / "check_layouts.py")

    def checked(*files: Path) -> tuple[int, str]:
        command = [sys.executable, "-W", "error", example, *map(str, files)]
        done = subprocess.run(command, capture_output=True, encoding="utf-8", env=UTF8, timeout=60, check=False)
        assert done.stderr == ""
        return done.returncode, done.stdout

    sizing = dwv.size(house)
    violated = any(finding.severity == "violation" for finding in sizing.findings)
    status, said = checked(house)
    assert status == int(violated)
    assert all(finding.message in said for finding in sizing.findings)
    # NPC 2015 2.5.6.5.(5): a vent ends at least 150 mm above the roof.
    status, said = checked(tmp_path / "low.layout.json")
    assert status == 1
    assert "violation: " in said
    status, said = checked(tmp_path / "none.layout.json", tmp_path / "bad.layout.json", house)
    assert status == 2
    assert "none.layout.json" in said
    assert f"{tmp_path / 'bad.layout.json'}: 2 faults" in said
    assert "terminals[0].thru: " in said
    assert f"{house}: Alder" in said


@pytest.mark.parametrize("example", sorted(path.name for path in EXAMPLES.glob("*.py")))
def test_every_example_is_run_here(example: str) -> None:
    assert f'"{example}"' in Path(__file__).read_text(encoding="utf-8")
