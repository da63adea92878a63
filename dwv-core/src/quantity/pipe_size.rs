//! Nominal pipe sizes, as the trade lists them.

use std::fmt::{self, Display};

use serde::de::Visitor;
use serde::{Deserialize, Deserializer, Serialize, Serializer};

use super::decimal::leading;
use super::error::{QuantityError, shown};
use super::length::Length;

/// A nominal pipe size in inches.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
#[repr(u8)]
pub enum PipeSize {
    /// 3/4 in
    ThreeQuarters,
    /// 1-1/4 in
    OneAndQuarter,
    /// 1-1/2 in
    OneAndHalf,
    /// 2 in
    Two,
    /// 2-1/2 in
    TwoAndHalf,
    /// 3 in
    Three,
    /// 4 in
    Four,
    /// 5 in
    Five,
    /// 6 in
    Six,
    /// 8 in
    Eight,
    /// 10 in
    Ten,
    /// 12 in
    Twelve,
    /// 15 in
    Fifteen,
}

const WHAT: &str = "pipe size";
const EXPECTED: &str = "3/4, 1-1/4, 1-1/2, 2, 2-1/2, 3, 4, 5, 6, 8, 10, 12 or 15 (inches)";

impl PipeSize {
    /// All sizes, the smallest first.
    pub const ALL: [Self; 13] = [
        Self::ThreeQuarters,
        Self::OneAndQuarter,
        Self::OneAndHalf,
        Self::Two,
        Self::TwoAndHalf,
        Self::Three,
        Self::Four,
        Self::Five,
        Self::Six,
        Self::Eight,
        Self::Ten,
        Self::Twelve,
        Self::Fifteen,
    ];

    /// Its rank among all sizes.
    #[must_use]
    pub const fn index(self) -> usize {
        self as usize
    }

    /// The size of a rank.
    #[must_use]
    pub fn from_index(index: usize) -> Option<Self> {
        Self::ALL.get(index).copied()
    }

    /// The nominal size in quarter inches.
    const fn quarters(self) -> i64 {
        match self {
            Self::ThreeQuarters => 3,
            Self::OneAndQuarter => 5,
            Self::OneAndHalf => 6,
            Self::Two => 8,
            Self::TwoAndHalf => 10,
            Self::Three => 12,
            Self::Four => 16,
            Self::Five => 20,
            Self::Six => 24,
            Self::Eight => 32,
            Self::Ten => 40,
            Self::Twelve => 48,
            Self::Fifteen => 60,
        }
    }

    /// The nominal size as a length.
    #[must_use]
    pub const fn nominal(self) -> Length {
        Length::from_sixty_fourths(self.quarters() * 16)
    }

    /// The size as it is written: `1-1/2`.
    #[must_use]
    pub const fn text(self) -> &'static str {
        match self {
            Self::ThreeQuarters => "3/4",
            Self::OneAndQuarter => "1-1/4",
            Self::OneAndHalf => "1-1/2",
            Self::Two => "2",
            Self::TwoAndHalf => "2-1/2",
            Self::Three => "3",
            Self::Four => "4",
            Self::Five => "5",
            Self::Six => "6",
            Self::Eight => "8",
            Self::Ten => "10",
            Self::Twelve => "12",
            Self::Fifteen => "15",
        }
    }

    /// Reads a size: `1-1/2`, `1 1/2`, `1.5`, `1½`, with or without `in`, `"` or `NPS`.
    ///
    /// # Errors
    /// A text that is no size of the list.
    pub fn parse(text: &str) -> Result<Self, QuantityError> {
        if let Some(size) = Self::ALL.into_iter().find(|size| size.text() == text) {
            return Ok(size);
        }
        if text.trim().is_empty() {
            return Err(QuantityError::Empty { what: WHAT, expected: EXPECTED });
        }
        let unreadable = || QuantityError::Unreadable { what: WHAT, input: shown(text), expected: EXPECTED };
        let body = text.trim();
        let body = body.strip_prefix("NPS").map_or(body, str::trim_start);
        let (value, rest) = leading(body).ok_or_else(unreadable)?;
        if !matches!(rest.trim(), "" | "in" | "\"" | "″" | "inch" | "inches") {
            return Err(unreadable());
        }
        let quarters = value.numerator.checked_mul(4).filter(|parts| parts % value.denominator == 0);
        let quarters = quarters.map(|parts| parts / value.denominator);
        Self::ALL.into_iter().find(|size| Some(i128::from(size.quarters())) == quarters).ok_or_else(unreadable)
    }
}

impl Display for PipeSize {
    fn fmt(&self, out: &mut fmt::Formatter<'_>) -> fmt::Result {
        out.pad(self.text())
    }
}

impl Serialize for PipeSize {
    fn serialize<S: Serializer>(&self, serializer: S) -> Result<S::Ok, S::Error> {
        serializer.serialize_str(self.text())
    }
}

impl<'de> Deserialize<'de> for PipeSize {
    fn deserialize<D: Deserializer<'de>>(deserializer: D) -> Result<Self, D::Error> {
        struct TextOrNumber;

        impl Visitor<'_> for TextOrNumber {
            type Value = PipeSize;

            fn expecting(&self, out: &mut fmt::Formatter<'_>) -> fmt::Result {
                out.write_str(EXPECTED)
            }

            fn visit_str<E: serde::de::Error>(self, text: &str) -> Result<PipeSize, E> {
                PipeSize::parse(text).map_err(E::custom)
            }

            fn visit_f64<E: serde::de::Error>(self, number: f64) -> Result<PipeSize, E> {
                PipeSize::parse(&number.to_string()).map_err(E::custom)
            }

            fn visit_i64<E: serde::de::Error>(self, number: i64) -> Result<PipeSize, E> {
                PipeSize::parse(&number.to_string()).map_err(E::custom)
            }

            fn visit_u64<E: serde::de::Error>(self, number: u64) -> Result<PipeSize, E> {
                PipeSize::parse(&number.to_string()).map_err(E::custom)
            }
        }

        deserializer.deserialize_any(TextOrNumber)
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn reads_every_way_of_writing_a_size() {
        for text in ["1-1/2", "1 1/2", "1.5", "1½", "1-1/2 in", "1-1/2\"", "NPS 1-1/2", "3/2"] {
            assert_eq!(PipeSize::parse(text), Ok(PipeSize::OneAndHalf), "{text}");
        }
        for text in ["", "1.6", "7", "big", "-2", "2 m", "NaN"] {
            assert!(PipeSize::parse(text).is_err(), "{text}");
        }
    }

    #[test]
    fn sizes_are_in_order_and_read_back() {
        assert!(PipeSize::ALL.windows(2).all(|two| two[0].nominal() < two[1].nominal() && two[0] < two[1]));
        assert!(PipeSize::ALL.into_iter().all(|size| PipeSize::parse(size.text()) == Ok(size)));
    }
}
