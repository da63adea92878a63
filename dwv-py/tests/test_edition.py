"""Editions and plain questions."""

from __future__ import annotations

import pickle

import dwv
import pytest


@pytest.fixture
def code() -> dwv.Edition:
    return dwv.edition("npc-2015")


def test_editions_are_listed_and_found() -> None:
    assert "npc-2015" in dwv.editions()
    for name in dwv.editions():
        assert dwv.edition(name).id == name


def test_an_edition_is_a_value(code: dwv.Edition) -> None:
    assert eval(repr(code), {"dwv": dwv}) == code
    assert pickle.loads(pickle.dumps(code)) == code
    assert hash(dwv.edition("npc-2015")) == hash(code)
    assert code != "npc-2015"
    assert code.title == "National Plumbing Code of Canada 2015"
    with pytest.raises(AttributeError):
        code.id = "other"  # type: ignore[misc]
    with pytest.raises(AttributeError):
        del code._edition


def test_an_unknown_edition_is_refused_with_the_nearest() -> None:
    with pytest.raises(dwv.EditionError, match="did you mean `npc-2015`") as caught:
        dwv.edition("npc-2051")
    assert isinstance(caught.value, LookupError)
    assert caught.value.faults == (
        dwv.Fault("unknown-id", "edition", None, "no edition has the id `npc-2051`", "did you mean `npc-2015`?"),
    )


def test_questions_are_dicts_or_json(code: dwv.Edition) -> None:
    """NPC 2015 Table 2.5.7.1.: a trap of 2 in asks for a vent of 1-1/2 in."""
    answer = code.answer({"ask": "vent-for-trap", "trap": 2})
    assert answer == code.answer('{"ask": "vent-for-trap", "trap": "2"}')
    assert (answer.text, answer.clause) == ("1-1/2", "NPC 2015 Table 2.5.7.1.")
    assert pickle.loads(pickle.dumps(answer)) == answer
    assert eval(repr(answer), {"Answer": dwv.Answer}) == answer


def test_cells_answer_as_questions_do(code: dwv.Edition) -> None:
    assert code.vent_for_trap("2") == code.answer({"ask": "vent-for-trap", "trap": "2"}).text
    load = {"ask": "fixture-load", "fixture": "lavatory", "trap": "1-1/2"}
    assert code.load_of_fixture("lavatory", "1-1/2") == float(code.answer(load).text)
    role = {"ask": "drain-for-load", "role": "building-drain", "load": 30, "slope": "1:50"}
    assert code.drain_for_load("building-drain", 30, "1:50") == code.answer(role).text
    assert code.longest_trap_arm(2) == code.answer({"ask": "trap-arm-longest", "size": "2"}).text


def test_every_kind_of_fixture_has_a_load_or_says_that_it_has_none(code: dwv.Edition) -> None:
    kinds = code.fixture_kinds()
    assert {"kitchen-sink", "lavatory", "water-closet", "floor-drain"} <= set(kinds)
    for kind in kinds:
        text = code.answer({"ask": "fixture-load", "fixture": kind}).text
        if text.replace(".", "").isdecimal():
            assert code.load_of_fixture(kind) == float(text)
        else:
            with pytest.raises(dwv.QuestionError, match=text):
                code.load_of_fixture(kind)


@pytest.mark.parametrize(
    "question",
    [
        {},
        {"ask": "vent-for-trap"},
        {"ask": "vent-for-trap", "trap": "1-3/8"},
        {"ask": "vent-for-trap", "trap": float("nan")},
        {"ask": "vent-for-trap", "trap": b"2"},
        {"ask": "vent-for-trap", "trap": "2", "more": 1},
        {"ask": "fixture-load", "fixture": "kichen-sink"},
        {"ask": "rule", "name": "none"},
        {"ask": "\ud800"},
        "",
        "\ud800",
        "[]",
        "null",
    ],
)
def test_what_is_no_question_is_refused(code: dwv.Edition, question: dict[str, object] | str) -> None:
    with pytest.raises(dwv.QuestionError) as caught:
        code.answer(question)
    assert caught.value.faults


def test_provenance_tells_of_every_unattested_value(code: dwv.Edition) -> None:
    page = code.provenance()
    assert page.startswith(f"# {code.title}")
    assert f"{len(code.unattested())} of " in page
    assert "licensed practitioner" in page


def test_falls_are_exact_and_in_the_unit_of_the_length() -> None:
    """Worked out by hand: 3 m at 1:50 is 60 mm; 10 ft at 1/4 in per ft is 2-1/2 in, 0.2083… ft is no whole 1/64 in."""
    assert dwv.fall("3000 mm", "1:50") == "60 mm"
    assert dwv.fall("10'-0\"", "1/4 in per ft") == "0'-2 1/2\""
    assert dwv.fall("7.5 m", "2 %") == "0.15 m"
    assert dwv.length_m("12 in") == 0.3048


@pytest.mark.parametrize("text", ["", "3", "3 cubits", "nan m", "1e308 m", "\ud800", "1,5 m"])
def test_quantities_that_cannot_be_read_are_refused(text: str) -> None:
    with pytest.raises(dwv.QuantityError) as caught:
        dwv.length_m(text)
    assert [fault.code for fault in caught.value.faults] == ["wrong-quantity"]
    with pytest.raises(dwv.QuantityError) as caught:
        dwv.fall(text, "1:50")
    assert caught.value.faults[0].path == "length"
    with pytest.raises(dwv.QuantityError) as caught:
        dwv.fall("1 m", text)
    assert caught.value.faults[0].path == "slope"
