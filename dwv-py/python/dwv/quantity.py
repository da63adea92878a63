"""Plain reckoning with lengths and slopes, for scripts and spreadsheet cells."""

from __future__ import annotations

from . import _dwv


def fall(length: str, slope: str) -> str:
    r"""How far a pipe falls over a length: exactly, in the unit of the length, or in inches where that is feet.

    Args:
        length: A length with its unit, such as `"4.5 m"` or `"3'-6 1/2\""`.
        slope: A slope, such as `"1:50"`, `"2 %"` or `"1/4 in per ft"`.

    Raises:
        QuantityError: The length or the slope cannot be read.

    >>> fall("4.5 m", "1:50")
    '0.09 m'
    >>> fall("12 ft", "1/4 in per ft")
    '3 in'
    """
    return _dwv.fall(length, slope)


def length_m(text: str) -> float:
    r"""A length in metres.

    Args:
        text: A length with its unit, such as `"450 mm"` or `"3'-6 1/2\""`.

    Raises:
        QuantityError: The length cannot be read.

    >>> length_m("3'-6 1/2\"")
    1.0795
    """
    return _dwv.length_m(text)
