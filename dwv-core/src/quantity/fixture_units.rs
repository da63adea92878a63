//! Hydraulic load in fixture units, in whole thousandths.

use std::fmt::{self, Display};
use std::iter::Sum;
use std::ops::Add;

use serde::de::Visitor;
use serde::{Deserialize, Deserializer, Serialize, Serializer};

use super::decimal::leading;
use super::error::{QuantityError, shown};

/// A hydraulic load in fixture units. Sums of whole thousandths do not depend on their order.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash, Default)]
pub struct FixtureUnits(u64);

const WHAT: &str = "load";
const EXPECTED: &str = "a number of fixture units such as 1.5";

impl FixtureUnits {
    /// No load.
    pub const ZERO: Self = Self(0);

    /// A load of so many thousandths of a fixture unit.
    #[must_use]
    pub const fn from_thousandths(thousandths: u64) -> Self {
        Self(thousandths)
    }

    /// The load in thousandths of a fixture unit.
    #[must_use]
    pub const fn thousandths(self) -> u64 {
        self.0
    }

    /// A number of fixture units, to the nearest thousandth.
    ///
    /// # Errors
    /// A number below zero, above a thousand million or not finite.
    pub fn from_number(number: f64) -> Result<Self, QuantityError> {
        if !(0.0..=1e9).contains(&number) {
            let input = shown(&format!("{number:?}"));
            return Err(QuantityError::OutOfRange { what: WHAT, input, expected: "0 to 1000000000 fixture units" });
        }
        Ok(Self((number * 1000.0).round() as u64))
    }

    /// Reads a number of fixture units.
    ///
    /// # Errors
    /// A text that is no number of at least 0.
    pub fn parse(text: &str) -> Result<Self, QuantityError> {
        if text.trim().is_empty() {
            return Err(QuantityError::Empty { what: WHAT, expected: EXPECTED });
        }
        let unreadable = || QuantityError::Unreadable { what: WHAT, input: shown(text), expected: EXPECTED };
        let (value, rest) = leading(text.trim()).ok_or_else(unreadable)?;
        if !matches!(rest.trim(), "" | "FU" | "fu") {
            return Err(unreadable());
        }
        let thousandths = value.times(1000).and_then(|value| u64::try_from(value).ok());
        thousandths.filter(|value| *value <= 1_000_000_000_000).map(Self).ok_or_else(|| QuantityError::OutOfRange {
            what: WHAT,
            input: shown(text),
            expected: "0 to 1000000000 fixture units",
        })
    }

    /// What is left after taking `other` away; none when there is not so much.
    #[must_use]
    pub const fn checked_sub(self, other: Self) -> Option<Self> {
        match self.0.checked_sub(other.0) {
            Some(left) => Some(Self(left)),
            None => None,
        }
    }
}

impl Add for FixtureUnits {
    type Output = Self;

    fn add(self, other: Self) -> Self {
        Self(self.0.saturating_add(other.0))
    }
}

impl Sum for FixtureUnits {
    fn sum<I: Iterator<Item = Self>>(loads: I) -> Self {
        loads.fold(Self::ZERO, Add::add)
    }
}

impl Display for FixtureUnits {
    fn fmt(&self, out: &mut fmt::Formatter<'_>) -> fmt::Result {
        let (whole, part) = (self.0 / 1000, self.0 % 1000);
        if part == 0 {
            return out.pad(&whole.to_string());
        }
        out.pad(format!("{whole}.{part:03}").trim_end_matches('0'))
    }
}

impl Serialize for FixtureUnits {
    fn serialize<S: Serializer>(&self, serializer: S) -> Result<S::Ok, S::Error> {
        if self.0.is_multiple_of(1000) {
            serializer.serialize_u64(self.0 / 1000)
        } else {
            serializer.serialize_f64(self.0 as f64 / 1000.0)
        }
    }
}

impl<'de> Deserialize<'de> for FixtureUnits {
    fn deserialize<D: Deserializer<'de>>(deserializer: D) -> Result<Self, D::Error> {
        struct NumberOrText;

        impl Visitor<'_> for NumberOrText {
            type Value = FixtureUnits;

            fn expecting(&self, out: &mut fmt::Formatter<'_>) -> fmt::Result {
                out.write_str(EXPECTED)
            }

            fn visit_str<E: serde::de::Error>(self, text: &str) -> Result<FixtureUnits, E> {
                FixtureUnits::parse(text).map_err(E::custom)
            }

            fn visit_f64<E: serde::de::Error>(self, number: f64) -> Result<FixtureUnits, E> {
                FixtureUnits::from_number(number).map_err(E::custom)
            }

            fn visit_i64<E: serde::de::Error>(self, number: i64) -> Result<FixtureUnits, E> {
                FixtureUnits::from_number(number as f64).map_err(E::custom)
            }

            fn visit_u64<E: serde::de::Error>(self, number: u64) -> Result<FixtureUnits, E> {
                FixtureUnits::from_number(number as f64).map_err(E::custom)
            }
        }

        deserializer.deserialize_any(NumberOrText)
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn prints_without_trailing_zeros() {
        let print = |text: &str| FixtureUnits::parse(text).unwrap().to_string();
        assert_eq!(
            (print("1.5"), print("24"), print("0.125"), print("1-1/2")),
            ("1.5".into(), "24".into(), "0.125".into(), "1.5".into())
        );
        assert!(FixtureUnits::parse("-1").is_err());
        assert!(FixtureUnits::from_number(f64::NAN).is_err());
        assert!(FixtureUnits::from_number(-0.5).is_err());
    }
}
