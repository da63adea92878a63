"""Input of every wrong kind is refused in an orderly way, and never ends the process."""

from __future__ import annotations

import json
from decimal import Decimal
from typing import Any

import dwv
import pytest
from hypothesis import given, settings
from hypothesis import strategies as st

SINK: dict[str, Any] = {
    "format": "dwv-layout/1",
    "name": "one sink",
    "edition": "npc-2015",
    "frost_can_close_vents": True,
    "levels": [{"id": "main", "floor": "0 m"}],
    "fixtures": [{"id": "KS", "kind": "kitchen-sink", "level": "main", "height": "0.45 m"}],
    "joints": [{"id": "J1", "level": "main", "height": "0.4 m"}, {"id": "S", "level": "main", "height": "-1 m"}],
    "drains": [
        {"id": "d1", "from": "KS", "to": "J1", "runs": "level", "length": "0.9 m"},
        {"id": "d2", "from": "J1", "to": "S", "runs": "vertical"},
    ],
    "vents": [{"id": "v1", "from": "J1", "to": "T1", "length": "6.1 m"}],
    "terminals": [{"id": "T1", "through": "roof", "above": "300 mm"}],
    "sewer": {"at": "S", "invert": "-1 m"},
}


def changed(element: str, key: str, value: object) -> dict[str, Any]:
    drawing: dict[str, Any] = json.loads(json.dumps(SINK))
    (drawing["sewer"] if element == "sewer" else drawing[element][0])[key] = value
    return drawing


@pytest.mark.parametrize("wrong", [None, 3, 2.5, True, object(), ["{}"], {1, 2}, dwv.Layout])
def test_what_is_no_layout_is_a_type_error(wrong: Any) -> None:
    for act in (dwv.size, dwv.Layout.from_json):
        with pytest.raises(TypeError):
            act(wrong)


@pytest.mark.parametrize("wrong", [None, 3, b"npc-2015", ["npc-2015"]])
def test_what_is_no_text_is_a_type_error(wrong: Any, sizing: dwv.Sizing) -> None:
    acts: list[Any] = [dwv.edition, dwv.length_m, sizing.why, lambda text: dwv.fall(text, "1:50")]
    for act in acts:
        with pytest.raises(TypeError):
            act(wrong)
    if wrong is not None:
        with pytest.raises(TypeError):
            dwv.size(SINK, edition=wrong)


def test_a_word_that_says_nothing_about_unattested_values_is_refused() -> None:
    with pytest.raises(dwv.QuestionError, match="`perhaps`"):
        dwv.size(SINK, unattested="perhaps")  # type: ignore[arg-type]


@pytest.mark.parametrize(
    "text",
    [
        "",
        " ",
        "{",
        "[]",
        "null",
        "NaN",
        "\x00",
        '{"format": "dwv-layout/1", "format": "dwv-layout/1"}',
        '{"name": "\ud800"}',
        "[" * 100_000,
        '{"a":' * 100_000,
        "1e999",
        "9" * 10_000,
    ],
)
def test_text_that_is_no_layout_is_refused(text: str) -> None:
    with pytest.raises(dwv.FormatError) as caught:
        dwv.size(text)
    assert caught.value.faults


@pytest.mark.parametrize("encoding", ["utf-16", "utf-32", "latin-1", "cp037"])
def test_another_encoding_is_refused(encoding: str) -> None:
    text = json.dumps(SINK | {"name": "Érable"}, ensure_ascii=False)
    with pytest.raises(dwv.FormatError):
        dwv.Layout.from_json(text.encode(encoding))


@pytest.mark.parametrize(
    ("value", "code"),
    [
        (float("nan"), "out-of-range"),
        (float("-inf"), "out-of-range"),
        (10**5000, "out-of-range"),
        (b"0.45 m", "wrong-type"),
        (Decimal("0.45"), "wrong-type"),
        (object(), "wrong-type"),
        ({1, 2}, "wrong-type"),
        (0.45j, "wrong-type"),
        ({b"m": 1}, "wrong-type"),
        ([], "wrong-type"),
        ({}, "wrong-type"),
        (True, "wrong-type"),
        ("", "wrong-quantity"),
        ("\x00", "wrong-quantity"),
        ("nan m", "wrong-quantity"),
        ("1e308 m", "wrong-quantity"),
    ],
    ids=lambda value: type(value).__name__ if not isinstance(value, str) else value,
)
def test_a_wrong_value_is_refused_with_its_place(value: object, code: str) -> None:
    with pytest.raises(dwv.FormatError) as caught:
        dwv.Layout.from_dict(changed("fixtures", "height", value))
    assert [(fault.code, fault.path) for fault in caught.value.faults] == [(code, "fixtures[0].height")]
    assert "fixtures[0].height" in str(caught.value)


@pytest.mark.parametrize("value", [1e308, -1e308, 10**300, 2**63, 5, 0.1, "1000000 km", "999999999999 m"])
def test_a_length_beyond_all_buildings_or_without_unit_is_refused(value: object) -> None:
    for element, key in [("fixtures", "height"), ("drains", "length"), ("levels", "floor"), ("sewer", "invert")]:
        with pytest.raises((dwv.FormatError, dwv.DrawingError)) as caught:
            dwv.size(changed(element, key, value))
        place = f"{element}.{key}" if element == "sewer" else f"{element}[0].{key}"
        assert place in [fault.path for fault in caught.value.faults]


def test_several_wrong_values_are_told_together() -> None:
    drawing = changed("fixtures", "height", float("nan"))
    drawing["drains"][1]["drop"] = b"1 m"
    with pytest.raises(dwv.FormatError, match="2 faults") as caught:
        dwv.size(drawing)
    assert [fault.path for fault in caught.value.faults] == ["fixtures[0].height", "drains[1].drop"]


def test_a_drawing_within_itself_is_refused() -> None:
    drawing = dict(SINK)
    drawing["sewer"] = drawing
    with pytest.raises(dwv.FormatError, match="nested too deep"):
        dwv.size(drawing)


def test_a_lone_surrogate_is_refused() -> None:
    with pytest.raises(dwv.FormatError):
        dwv.Layout.from_dict(SINK | {"name": "\ud800"})
    with pytest.raises(dwv.FormatError):
        dwv.Layout.builder("\ud800").build()


VALUES = st.recursive(
    st.none() | st.booleans() | st.integers() | st.floats() | st.text() | st.binary(max_size=3),
    lambda inner: st.lists(inner, max_size=3) | st.dictionaries(st.text(max_size=8), inner, max_size=3),
    max_leaves=6,
)
PLACES = st.sampled_from(
    [
        (name, key)
        for name, list_ in SINK.items()
        if isinstance(list_, list)
        for key in (*list_[0], "size", "at", "turns")
    ]
    + [("sewer", "at"), ("sewer", "invert")]
)


@given(PLACES, VALUES)
@settings(deadline=None)
def test_any_value_in_any_place_is_sized_or_refused(place: tuple[str, str], value: object) -> None:
    element, key = place
    try:
        sizing = dwv.size(changed(element, key, value))
    except dwv.DwvError as error:
        assert error.faults, error  # noqa: PT017 (an internal error has none)
    else:
        assert json.loads(sizing.to_json())["format"] == "dwv-sizing/1"


@given(st.binary() | st.text() | VALUES)
@settings(deadline=None)
def test_anything_at_all_is_refused(value: Any) -> None:
    with pytest.raises((dwv.FormatError, TypeError)):
        dwv.size(value)


@given(st.data())
@settings(deadline=None)
def test_a_file_with_some_bytes_changed_is_read_or_refused(data: st.DataObject) -> None:
    content = bytearray(json.dumps(SINK).encode())
    for _ in range(data.draw(st.integers(1, 4))):
        content[data.draw(st.integers(0, len(content) - 1))] = data.draw(st.integers(0, 255))
    try:
        dwv.size(content[: data.draw(st.integers(0, len(content)))])
    except dwv.DwvError as error:
        assert error.faults, error  # noqa: PT017 (an internal error has none)
