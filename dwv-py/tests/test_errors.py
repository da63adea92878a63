"""Every exception, with its faults as data."""

from __future__ import annotations

import pickle
import traceback
from collections.abc import Callable

import dwv
import pytest
from dwv import _dwv


def cycle() -> dwv.Sizing:
    drawing = dwv.Layout.builder("round and round").level("main", "0 m").fixture("KS", "kitchen-sink", "main")
    drawing.joint("J", "main").joint("K", "main").joint("S", "main")
    drawing.drain("d1", "KS", "J").drain("d2", "J", "K").drain("d3", "K", "J").sewer("S")
    return dwv.size(drawing.build())


def ragged() -> str:
    """A table that no schedule makes: the engine does not expect it and panics."""
    return _dwv.table_text("ragged", ["a", "b"], [False, False], [["1"]])


RAISED: list[tuple[Callable[[], object], type[dwv.DwvError], type[Exception], str]] = [
    (lambda: dwv.Layout.from_json("{"), dwv.FormatError, ValueError, "not-json"),
    (lambda: dwv.Layout.from_json(b"\xff\xfe{\x00"), dwv.FormatError, ValueError, "not-utf8"),
    (cycle, dwv.DrawingError, ValueError, "cycle"),
    (lambda: dwv.length_m("3 cubits"), dwv.QuantityError, ValueError, "wrong-quantity"),
    (lambda: dwv.edition("npc-1066"), dwv.EditionError, LookupError, "unknown-id"),
    (lambda: dwv.edition("npc-2015").load_of_fixture("spoon"), dwv.QuestionError, LookupError, "unknown-kind"),
]


@pytest.mark.parametrize(("act", "kind", "base", "code"), RAISED)
def test_every_exception_carries_its_faults(
    act: Callable[[], object], kind: type[dwv.DwvError], base: type[Exception], code: str
) -> None:
    with pytest.raises(kind) as caught:
        act()
    error = caught.value
    assert type(error) is kind
    assert isinstance(error, base)
    assert isinstance(error, dwv.DwvError)
    assert code in [fault.code for fault in error.faults]
    assert error.total == len(error.faults) > 0
    for fault in error.faults:
        assert fault.message in str(error)
        assert fault.help is None or fault.help in str(error)
        assert "\n" not in fault.message
        assert not fault.message.endswith(".")
    again = pickle.loads(pickle.dumps(error))
    assert type(again) is kind
    assert (str(again), again.faults, again.total) == (str(error), error.faults, error.total)


def test_a_panic_of_the_engine_is_an_exception_like_others(capfd: pytest.CaptureFixture[str]) -> None:
    with pytest.raises(dwv.InternalError, match="please report") as caught:
        ragged()
    assert isinstance(caught.value, Exception)
    assert caught.value.faults == ()
    assert type(pickle.loads(pickle.dumps(caught.value))) is dwv.InternalError
    assert "panicked" in capfd.readouterr().err
    # The engine goes on working.
    assert dwv.edition("npc-2015").vent_for_trap("2") == "1-1/2"


def test_faults_name_element_and_path() -> None:
    drawing = dwv.Layout.builder("Heron").level("main", "0 m").fixture("KS", "kichen-sink", "main")
    drawing.joint("S", "main").drain("d1", "KS", "T").sewer("S")
    with pytest.raises(dwv.DrawingError) as caught:
        dwv.size(drawing.build())
    faults = {fault.path: fault for fault in caught.value.faults}
    assert faults["fixtures[0].kind"].element == "KS"
    assert faults["fixtures[0].kind"].help == "did you mean `kitchen-sink`?"
    assert faults["drains[0].to"].element == "d1"


def test_many_faults_are_counted_and_the_first_hundred_listed() -> None:
    drawing = dwv.Layout.builder("Heron")
    for index in range(130):
        drawing.level(f"L{index}", "0 cubits")
    with pytest.raises(dwv.FormatError, match="and 31 more") as caught:
        drawing.build()
    # One more: there is no sewer.
    assert (len(caught.value.faults), caught.value.total) == (100, 131)
    assert pickle.loads(pickle.dumps(caught.value)).total == 131


def test_a_path_that_is_taken_for_json_is_hinted_at() -> None:
    with pytest.raises(dwv.FormatError) as caught:
        dwv.size("house.layout.json")
    assert "pathlib.Path" in "".join(traceback.format_exception(caught.value))
    assert pickle.loads(pickle.dumps(caught.value)).__notes__ == caught.value.__notes__


def test_every_class_stands_under_the_base() -> None:
    kinds = [getattr(dwv, name) for name in dwv.__all__ if name.endswith("Error")]
    assert len(kinds) == 7
    assert all(issubclass(kind, dwv.DwvError) for kind in kinds)
