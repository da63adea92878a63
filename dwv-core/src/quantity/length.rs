//! Lengths in whole nanometres: 1/64 inch and 0.1 mm are both exact.

use std::iter::Sum;
use std::ops::{Add, Neg, Sub};

use super::decimal::{Fraction, has_decimal_comma, leading, sign};
use super::error::{QuantityError, shown};
use super::written::{Quantity, Written};

/// A length, or a difference of heights: whole nanometres, negative below.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash, Default)]
pub struct Length(i64);

/// A unit that lengths are written in. The inch is 25.4 mm and the foot 0.3048 m exactly (international yard and pound agreement, 1959).
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
pub enum LengthUnit {
    /// `m`
    Metre,
    /// `cm`
    Centimetre,
    /// `mm`
    Millimetre,
    /// `ft`
    Foot,
    /// `in`
    Inch,
    /// `3'-6 1/2"`
    FootInch,
}

pub(super) const EXPECTED: &str = "a number with m, cm, mm, ft or in, or feet and inches such as 3'-6 1/2\"";
const WHAT: &str = "length";
const INCH: i64 = 25_400_000;
/// No length of a building comes near: 1000 km.
const MOST: i64 = 1_000_000_000_000_000;

impl LengthUnit {
    /// The unit as it is written after a number; feet and inches have the word of the declared unit, `ft-in`.
    #[must_use]
    pub fn symbol(self) -> &'static str {
        match self {
            Self::Metre => "m",
            Self::Centimetre => "cm",
            Self::Millimetre => "mm",
            Self::Foot => "ft",
            Self::Inch => "in",
            Self::FootInch => "ft-in",
        }
    }

    /// Its length in nanometres; feet and inches count in feet.
    #[must_use]
    pub fn nanometres(self) -> i64 {
        match self {
            Self::Metre => 1_000_000_000,
            Self::Centimetre => 10_000_000,
            Self::Millimetre => 1_000_000,
            Self::Inch => INCH,
            Self::Foot | Self::FootInch => 12 * INCH,
        }
    }

    /// All units.
    pub const ALL: [Self; 6] =
        [Self::Metre, Self::Centimetre, Self::Millimetre, Self::Foot, Self::Inch, Self::FootInch];

    /// Reads the name of a unit as it is declared: `m`, `cm`, `mm`, `ft`, `in`, `ft-in`.
    ///
    /// # Errors
    /// A word that is none of these.
    pub fn parse(text: &str) -> Result<Self, QuantityError> {
        let word = text.trim();
        Self::ALL.into_iter().find(|unit| unit.symbol() == word).ok_or_else(|| QuantityError::Unreadable {
            what: "unit of length",
            input: shown(text),
            expected: "m, cm, mm, ft, in or ft-in",
        })
    }

    fn named(word: &str) -> Option<Self> {
        Some(match word {
            "m" | "metre" | "metres" | "meter" | "meters" => Self::Metre,
            "cm" => Self::Centimetre,
            "mm" => Self::Millimetre,
            "ft" | "foot" | "feet" | "'" | "′" | "’" => Self::Foot,
            "in" | "inch" | "inches" | "\"" | "″" | "”" | "''" => Self::Inch,
            _ => return None,
        })
    }
}

impl Length {
    /// No length.
    pub const ZERO: Self = Self(0);

    /// A length of so many nanometres.
    #[must_use]
    pub const fn from_nanometres(nanometres: i64) -> Self {
        Self(nanometres)
    }

    /// A length of so many millimetres.
    #[must_use]
    pub const fn from_millimetres(millimetres: i64) -> Self {
        Self(millimetres.saturating_mul(1_000_000))
    }

    /// A length of so many 1/64 inch.
    #[must_use]
    pub const fn from_sixty_fourths(sixty_fourths: i64) -> Self {
        Self(sixty_fourths.saturating_mul(INCH / 64))
    }

    /// The length in nanometres.
    #[must_use]
    pub const fn nanometres(self) -> i64 {
        self.0
    }

    /// The length without its sign.
    #[must_use]
    pub const fn abs(self) -> Self {
        Self(self.0.saturating_abs())
    }

    /// Whether it is below zero.
    #[must_use]
    pub const fn is_negative(self) -> bool {
        self.0 < 0
    }

    /// The sum, unless it is too large.
    #[must_use]
    pub fn checked_add(self, other: Self) -> Option<Self> {
        self.0.checked_add(other.0).map(Self)
    }

    /// A number in a unit, to the nearest nanometre.
    ///
    /// # Errors
    /// A number that is not finite or is beyond 1000 km.
    pub fn from_number(number: f64, unit: LengthUnit) -> Result<Self, QuantityError> {
        // Through the shortest decimal text that stands for the number, so that 1.2 is 1.2 and not 1.19999…
        let text = format!("{number}");
        let out_of_range =
            || QuantityError::OutOfRange { what: WHAT, input: shown(&text), expected: "at most 1000 km" };
        if !number.is_finite() || number.abs() > 1e15 {
            return Err(out_of_range());
        }
        let (negative, digits) = sign(&text);
        let value = match leading(digits) {
            Some((value, "")) => value.times(i128::from(unit.nanometres())),
            _ => Some(if number.abs() < 1e-6 { 0 } else { return Err(out_of_range()) }),
        };
        Self::checked(value, negative).ok_or_else(out_of_range)
    }

    fn checked(value: Option<i128>, negative: bool) -> Option<Self> {
        let value = i64::try_from(value?).ok().filter(|value| *value <= MOST)?;
        Some(Self(if negative { -value } else { value }))
    }

    /// Reads a length with its unit: `1.2 m`, `450 mm`, `3'-6 1/2"`, `9-1/2 ft`, `3 ft 6 in`, `-0.3 m`.
    /// Digits finer than a nanometre are rounded.
    ///
    /// # Errors
    /// A text without a number or unit, an unknown unit, more than 1000 km.
    pub fn parse(text: &str) -> Result<Written<Self>, QuantityError> {
        let trimmed = text.trim();
        if trimmed.is_empty() {
            return Err(QuantityError::Empty { what: WHAT, expected: EXPECTED });
        }
        let unreadable = || {
            let input = shown(text);
            if has_decimal_comma(text) {
                QuantityError::DecimalComma { what: WHAT, input, expected: EXPECTED }
            } else {
                QuantityError::Unreadable { what: WHAT, input, expected: EXPECTED }
            }
        };
        let (negative, body) = sign(trimmed);
        let (first, rest) = leading(body).ok_or_else(unreadable)?;
        let (unit, rest) = Self::unit(rest, text, &unreadable)?;
        let mut value = first.times(i128::from(unit.nanometres()));
        let mut notation = unit;
        if !rest.is_empty() {
            // Only feet may be followed by inches.
            if unit != LengthUnit::Foot {
                return Err(unreadable());
            }
            let rest = rest.strip_prefix('-').map_or(rest, str::trim_start);
            let (inches, rest) = leading(rest).ok_or_else(unreadable)?;
            let (inch, rest) = Self::unit(rest, text, &unreadable)?;
            if inch != LengthUnit::Inch || !rest.is_empty() || inches.times(1).is_none() {
                return Err(unreadable());
            }
            value = value.zip(inches.times(i128::from(INCH))).and_then(|(feet, inches)| feet.checked_add(inches));
            notation = LengthUnit::FootInch;
        } else if unit == LengthUnit::Foot && body.contains(['\'', '′', '’']) && is_whole(first) {
            notation = LengthUnit::FootInch;
        }
        let value = Self::checked(value, negative).ok_or_else(|| QuantityError::OutOfRange {
            what: WHAT,
            input: shown(text),
            expected: "at most 1000 km",
        })?;
        Ok(Written::new(value, notation))
    }

    /// The unit at the start of `rest`, and what follows it.
    fn unit<'a>(
        rest: &'a str,
        text: &str,
        unreadable: &impl Fn() -> QuantityError,
    ) -> Result<(LengthUnit, &'a str), QuantityError> {
        let rest = rest.trim_start();
        if rest.is_empty() {
            return Err(QuantityError::MissingUnit { what: WHAT, input: shown(text), expected: EXPECTED });
        }
        let mark = ["''", "'", "\"", "′", "″", "’", "”"].into_iter().find(|mark| rest.starts_with(mark));
        let end = match mark {
            Some(mark) => mark.len(),
            None => rest.find(|character: char| !character.is_alphabetic()).unwrap_or(rest.len()),
        };
        if end == 0 {
            return Err(unreadable());
        }
        let (word, after) = rest.split_at(end);
        let after = after.strip_prefix('.').unwrap_or(after).trim_start();
        let unit = LengthUnit::named(word).ok_or_else(|| QuantityError::UnknownUnit {
            what: WHAT,
            input: shown(text),
            unit: shown(word),
            expected: EXPECTED,
        })?;
        Ok((unit, after))
    }
}

fn is_whole(value: Fraction) -> bool {
    value.numerator % value.denominator == 0
}

impl Add for Length {
    type Output = Self;

    fn add(self, other: Self) -> Self {
        Self(self.0.saturating_add(other.0))
    }
}

impl Sub for Length {
    type Output = Self;

    fn sub(self, other: Self) -> Self {
        Self(self.0.saturating_sub(other.0))
    }
}

impl Neg for Length {
    type Output = Self;

    fn neg(self) -> Self {
        Self(self.0.saturating_neg())
    }
}

impl Sum for Length {
    fn sum<I: Iterator<Item = Self>>(lengths: I) -> Self {
        lengths.fold(Self::ZERO, Add::add)
    }
}

impl serde::Serialize for LengthUnit {
    fn serialize<S: serde::Serializer>(&self, serializer: S) -> Result<S::Ok, S::Error> {
        serializer.serialize_str(self.symbol())
    }
}

impl<'de> serde::Deserialize<'de> for LengthUnit {
    fn deserialize<D: serde::Deserializer<'de>>(deserializer: D) -> Result<Self, D::Error> {
        let word = <std::borrow::Cow<'_, str> as serde::Deserialize>::deserialize(deserializer)?;
        Self::parse(&word).map_err(serde::de::Error::custom)
    }
}

impl Quantity for Length {
    type Notation = LengthUnit;
    const EXPECTED: &'static str = EXPECTED;

    fn read(text: &str) -> Result<Written<Self>, QuantityError> {
        Self::parse(text)
    }

    fn write(self, notation: LengthUnit, out: &mut std::fmt::Formatter<'_>) -> std::fmt::Result {
        std::fmt::Display::fmt(&self.in_unit(notation), out)
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn nanometres(text: &str) -> i64 {
        Length::parse(text).unwrap().value.nanometres()
    }

    #[test]
    fn reads_what_people_write() {
        let inch = 25_400_000;
        assert_eq!(nanometres("3'-6 1/2\""), 42 * inch + inch / 2);
        assert_eq!(nanometres("3' 6-1/2\""), 42 * inch + inch / 2);
        assert_eq!(nanometres("3′-6½″"), 42 * inch + inch / 2);
        assert_eq!(nanometres("3 ft 6 in"), 42 * inch);
        assert_eq!(nanometres("9-1/2 ft"), 114 * inch);
        assert_eq!(nanometres("12.25'"), 147 * inch);
        assert_eq!(nanometres("1/2\""), inch / 2);
        assert_eq!(nanometres("1.2 m"), 1_200_000_000);
        assert_eq!(nanometres("450mm"), 450_000_000);
        assert_eq!(nanometres("4.5 cm"), 45_000_000);
        assert_eq!(nanometres("-0.3 m"), -300_000_000);
        assert_eq!(nanometres("−3'-6\""), -42 * inch);
    }

    #[test]
    fn says_what_was_expected() {
        let message = |text: &str| Length::parse(text).unwrap_err().to_string();
        assert!(message("3 cubits").contains("unknown unit `cubits`"));
        assert!(message("12").contains("no unit"));
        assert!(message("1,5 m").contains("decimal point"));
        assert!(message("").contains("empty"));
        assert!(message("long").contains("expected a number"));
        assert!(message("2000 km").contains("unknown unit"));
        assert!(message("9999999999 m").contains("out of range"));
        assert!(message("3 m 2 in").contains("cannot read"));
    }

    #[test]
    fn bare_numbers_keep_their_decimals() {
        let read = |number: f64, unit: LengthUnit| Length::from_number(number, unit).unwrap().nanometres();
        assert_eq!(read(1.2, LengthUnit::Metre), 1_200_000_000);
        assert_eq!(read(-0.1, LengthUnit::Millimetre), -100_000);
        assert_eq!(read(0.5, LengthUnit::Inch), 12_700_000);
        assert!(Length::from_number(f64::NAN, LengthUnit::Metre).is_err());
        assert!(Length::from_number(f64::INFINITY, LengthUnit::Metre).is_err());
        assert!(Length::from_number(1e300, LengthUnit::Metre).is_err());
    }
}
