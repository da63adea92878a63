"""JSON of Python values, with the place of whatever JSON cannot hold."""

from __future__ import annotations

import json
import math
from collections.abc import Iterator, Mapping

from .errors import DwvError, Fault

_DEEPEST = 64
"""No layout and no question is nested as deep as this."""


def json_text(value: Mapping[str, object], refuse: type[DwvError]) -> bytes:
    """Writes a mapping as JSON, or raises `refuse` with the place of every value that JSON does not have."""
    try:
        text = json.dumps(dict(value), ensure_ascii=False, allow_nan=False, default=_as_dict)
    except (TypeError, ValueError, RecursionError) as error:
        faults = tuple(_faults(value, "", 0)) or (Fault("wrong-type", "", None, str(error)),)
        lines = [f"{fault.path}: {fault.message}" if fault.path else fault.message for fault in faults]
        message = lines[0] if len(lines) == 1 else "\n  ".join([f"{len(lines)} faults:", *lines])
        raise refuse(message, faults) from None
    # A lone surrogate is no UTF-8: the engine says so.
    return text.encode("utf-8", "surrogatepass")


def _as_dict(value: object) -> object:
    if isinstance(value, Mapping):
        return dict(value)
    raise TypeError(f"a `{type(value).__name__}` is no value of JSON")


def _faults(value: object, path: str, depth: int) -> Iterator[Fault]:
    if depth > _DEEPEST:
        yield Fault("wrong-type", path.partition(".")[0], None, "lists and objects nested too deep, or in themselves")
    elif isinstance(value, Mapping):
        for key, inner in value.items():
            if isinstance(key, str):
                yield from _faults(inner, f"{path}.{key}" if path else key, depth + 1)
            else:
                yield Fault("wrong-type", path, None, f"the key `{key!r}` is a `{type(key).__name__}`, expected a text")
    elif isinstance(value, list | tuple):
        for index, inner in enumerate(value):
            yield from _faults(inner, f"{path}[{index}]", depth + 1)
    elif isinstance(value, float):
        if not math.isfinite(value):
            yield Fault("out-of-range", path, None, f"`{value}` is out of range, expected a finite number")
    elif isinstance(value, int):
        if value.bit_length() > 64:
            message = f"a whole number of {value.bit_length()} bits is out of range, expected one that 64 bits hold"
            yield Fault("out-of-range", path, None, message)
    elif value is not None and not isinstance(value, str):
        message = f"a `{type(value).__name__}` is no value of JSON, expected a text, number, true, false, list or dict"
        yield Fault("wrong-type", path, None, message)
