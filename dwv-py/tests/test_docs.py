"""The examples in docstrings run; those who read of `layout` and `sizing` find one kitchen sink with its vent."""

from __future__ import annotations

import doctest
import importlib
import pkgutil

import dwv
import pytest

MODULES = sorted(module.name for module in pkgutil.iter_modules(dwv.__path__, "dwv.") if module.name != "dwv._dwv")


def examples(module: str) -> list[doctest.DocTest]:
    return [test for test in doctest.DocTestFinder().find(importlib.import_module(module)) if test.examples]


EXAMPLES = [test for module in MODULES for test in examples(module)]


def test_examples_are_found() -> None:
    named = {test.name for test in EXAMPLES}
    assert {"dwv.layout.Layout", "dwv.sizing.size", "dwv.quantity.fall", "dwv.code_edition.Edition"} <= named


@pytest.mark.parametrize("test", EXAMPLES, ids=lambda test: test.name)
def test_example(test: doctest.DocTest, layout: dwv.Layout, sizing: dwv.Sizing) -> None:
    test.globs = {**test.globs, "layout": layout, "sizing": sizing}
    words: list[str] = []
    runner = doctest.DocTestRunner(optionflags=doctest.ELLIPSIS)
    assert runner.run(test, out=words.append).failed == 0, "".join(words)
