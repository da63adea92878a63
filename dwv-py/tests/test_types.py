"""The stubs say what the compiled module has, and strict typing holds over package, tests and examples."""

from __future__ import annotations

import subprocess
import sys
from pathlib import Path

import dwv

FACE = Path(__file__).parents[1]


def check(*command: str) -> None:
    done = subprocess.run([sys.executable, "-m", *command], cwd=FACE, capture_output=True, text=True, timeout=300)
    assert done.returncode == 0, done.stdout + done.stderr


def test_the_stub_matches_the_compiled_module() -> None:
    check("mypy.stubtest", "dwv._dwv")


def test_strict_typing_holds() -> None:
    check("mypy", "--strict", "python/dwv", "tests", "../python-examples")


def test_what_is_public_is_there_and_says_what_it_is_for() -> None:
    assert sorted(dwv.__all__) == dwv.__all__
    for name in dwv.__all__:
        public = getattr(dwv, name)
        if isinstance(public, type) or (callable(public) and hasattr(public, "__code__")):
            assert public.__doc__, name
        for method, value in vars(public).items() if isinstance(public, type) else ():
            if not method.startswith("_") and callable(value):
                assert value.__doc__, f"{name}.{method}"
