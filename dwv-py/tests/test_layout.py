"""Layouts: read, written, drawn in Python, compared, pickled."""

from __future__ import annotations

import copy
import json
import pickle
from pathlib import Path
from types import MappingProxyType

import dwv
import pytest


def test_json_text_bytes_and_dict_give_the_same_layout(layout: dwv.Layout) -> None:
    text = layout.to_json()
    drawing = json.loads(text)
    again = [
        dwv.Layout.from_json(text),
        dwv.Layout.from_json(text.encode()),
        dwv.Layout.from_json(bytearray(text.encode())),
        dwv.Layout.from_json("\ufeff" + text),
        dwv.Layout.from_dict(drawing),
        dwv.Layout.from_dict(MappingProxyType({**drawing, "sewer": MappingProxyType(drawing["sewer"])})),
    ]
    for other in again:
        assert other == layout
        assert hash(other) == hash(layout)
        assert other.to_json() == text


def test_a_file_gives_the_same_layout(layout: dwv.Layout, tmp_path: Path) -> None:
    path = tmp_path / "sink.layout.json"
    path.write_text(layout.to_json(), encoding="utf-8")
    assert dwv.Layout.from_file(path) == dwv.Layout.from_file(str(path)) == layout


def test_a_faulty_file_is_named(tmp_path: Path) -> None:
    path = tmp_path / "heron.layout.json"
    path.write_text('{"format": "dwv-layout/1"', encoding="utf-8")
    with pytest.raises(dwv.FormatError) as caught:
        dwv.Layout.from_file(path)
    assert caught.value.file == str(path)
    assert str(caught.value).startswith(f"{path}: ")
    with pytest.raises(dwv.FormatError) as caught:
        dwv.size(path)
    assert caught.value.file == str(path)


def test_a_missing_file_is_an_os_error(tmp_path: Path) -> None:
    with pytest.raises(FileNotFoundError, match=r"none\.layout\.json"):
        dwv.size(tmp_path / "none.layout.json")


def test_layouts_differ_by_what_they_hold(layout: dwv.Layout) -> None:
    other = dwv.Layout.from_json(layout.to_json().replace("0.9 m", "0.91 m"))
    assert other != layout
    assert layout != layout.to_json()
    assert len({layout, other, dwv.Layout.from_json(layout.to_json())}) == 2


def test_layouts_are_pickled_and_copied(layout: dwv.Layout) -> None:
    for protocol in range(pickle.HIGHEST_PROTOCOL + 1):
        again = pickle.loads(pickle.dumps(layout, protocol))
        assert again == layout
        assert type(again) is dwv.Layout
    assert copy.deepcopy(layout) == copy.copy(layout) == layout


def test_layouts_do_not_change(layout: dwv.Layout) -> None:
    for name in ("name", "edition", "remark"):
        with pytest.raises(AttributeError):
            setattr(layout, name, "other")


def test_a_layout_shows_what_it_holds(layout: dwv.Layout) -> None:
    assert repr(layout) == "<dwv.Layout 'one sink', npc-2015: 1 fixtures, 2 drains, 1 vents>"
    assert (layout.name, layout.edition) == ("one sink", "npc-2015")


def test_everything_that_can_be_drawn_is_written_as_it_was_stated() -> None:
    drawing = dwv.Layout.builder(
        "all", units="mm", frost_can_close_vents=False, pipe_sizes=["2", 3, 1.5], building_drain_ends_at="J"
    )
    drawing.level("main", 0)
    drawing.fixture("F1", "custom", "main", height=450, trap=1.5, load=2.5, at=(1000, "2 m"), group="g", future=True)
    drawing.fixture("F2", "custom", "main", outlet_length="0.2 m", continuous_flow="0.3 L/s")
    drawing.fixture("F3", "custom", "main", semi_continuous_flow="5 US gpm")
    drawing.joint("J", "main", height="-1 m", at=("1 m", "2 m")).joint("S", "main")
    drawing.drain("d1", "F1", "J", runs="sloped", length="3'-6 1/2\"", drop="0.1 m", slope="1/4 in per ft", size="2")
    drawing.drain("d2", "J", "S", name="building-drain", underground=True, outside=True, turns=90)
    drawing.vent("v1", "J", "T", length="6.1 m", size="1-1/2", name="stack-vent")
    drawing.terminal("T", through="wall", above="2 m", level="main", height="3 m", at=(0, 0))
    drawing.valve("A", grounds="island", level="main", height="1 m", at=(0, 0))
    drawing.cleanout("C", "J").sewer("S", invert="-2 m")
    written = json.loads(drawing.build().to_json())
    assert written == {
        "format": "dwv-layout/1",
        "name": "all",
        "edition": "npc-2015",
        "units": "mm",
        "frost_can_close_vents": False,
        "pipe_sizes": ["2", "3", "1-1/2"],
        "building_drain_ends_at": "J",
        "levels": [{"id": "main", "floor": 0}],
        "fixtures": [
            {
                "id": "F1",
                "kind": "custom",
                "level": "main",
                "at": [1000, "2 m"],
                "height": 450,
                "trap": "1-1/2",
                "load": 2.5,
                "group": "g",
                "future": True,
            },
            {"id": "F2", "kind": "custom", "level": "main", "continuous_flow": "0.3 L/s", "outlet_length": "0.2 m"},
            {"id": "F3", "kind": "custom", "level": "main", "semi_continuous_flow": "5 US gpm"},
        ],
        "joints": [
            {"id": "J", "level": "main", "at": ["1 m", "2 m"], "height": "-1 m"},
            {"id": "S", "level": "main"},
        ],
        "drains": [
            {
                "id": "d1",
                "from": "F1",
                "to": "J",
                "runs": "sloped",
                "length": "3'-6 1/2\"",
                "drop": "0.1 m",
                "slope": "1/4 in per ft",
                "size": "2",
            },
            {
                "id": "d2",
                "from": "J",
                "to": "S",
                "runs": "level",
                "name": "building-drain",
                "underground": True,
                "outside": True,
                "turns": 90,
            },
        ],
        "vents": [{"id": "v1", "from": "J", "to": "T", "length": "6.1 m", "size": "1-1/2", "name": "stack-vent"}],
        "terminals": [
            {"id": "T", "through": "wall", "level": "main", "at": [0, 0], "height": "3 m", "above": "2 m"},
        ],
        "valves": [{"id": "A", "grounds": "island", "level": "main", "at": [0, 0], "height": "1 m"}],
        "cleanouts": [{"id": "C", "at": "J"}],
        "sewer": {"at": "S", "invert": "-2 m"},
    }


def test_the_schema_knows_what_can_be_drawn(layout: dwv.Layout) -> None:
    schema = json.loads(dwv.layout_schema())
    assert set(json.loads(layout.to_json())) <= set(schema["properties"])


def test_drawing_goes_on_after_it_was_finished_once() -> None:
    drawing = dwv.Layout.builder("Heron").level("main", "0 m").joint("S", "main").sewer("S")
    first = drawing.build()
    second = drawing.joint("J", "main").build()
    assert first != second
    assert '"J"' not in first.to_json()


def test_all_faults_of_a_drawing_are_told_together() -> None:
    drawing = dwv.Layout.builder("Heron").level("main", "0 cubits")
    drawing.fixture("KS", "kitchen-sink", "main", trap="1-3/8").drain("d1", "KS", "S", slope="steep").sewer("S")
    with pytest.raises(dwv.FormatError) as caught:
        drawing.build()
    assert [fault.path for fault in caught.value.faults] == ["levels[0].floor", "fixtures[0].trap", "drains[0].slope"]
    assert caught.value.total == 3
