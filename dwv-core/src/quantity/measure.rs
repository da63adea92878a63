//! A length in a drawing: text with its unit, or a bare number under the declared unit.

use std::fmt;

use serde::de::Visitor;
use serde::{Deserialize, Deserializer, Serialize, Serializer};

use super::error::QuantityError;
use super::length::{EXPECTED, Length, LengthUnit};
use super::written::Written;

/// A length as a drawing states it.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Measure {
    /// With its unit, as typed.
    Written(Written<Length>),
    /// A bare number; the drawing declares the unit once.
    Number(f64),
}

impl Measure {
    /// The length, when bare numbers count in `unit`.
    ///
    /// # Errors
    /// A bare number without a declared unit, or one that is not finite or too large.
    pub fn resolve(self, unit: Option<LengthUnit>) -> Result<Length, QuantityError> {
        match (self, unit) {
            (Self::Written(written), _) => Ok(written.value),
            // Bare numbers under feet and inches count in feet.
            (Self::Number(number), Some(unit)) => Length::from_number(number, unit),
            (Self::Number(number), None) => Err(QuantityError::MissingUnit {
                what: "length",
                input: number.to_string(),
                expected: "a unit in the text, such as `\"1.2 m\"`, or `\"units\": \"m\"` once in the layout",
            }),
        }
    }

    /// Reads a length with its unit.
    ///
    /// # Errors
    /// As [`Length::parse`].
    pub fn parse(text: &str) -> Result<Self, QuantityError> {
        Length::parse(text).map(Self::Written)
    }
}

impl From<Written<Length>> for Measure {
    fn from(written: Written<Length>) -> Self {
        Self::Written(written)
    }
}

impl From<Length> for Measure {
    fn from(length: Length) -> Self {
        Self::Written(Written::new(length, LengthUnit::Metre))
    }
}

impl Serialize for Measure {
    fn serialize<S: Serializer>(&self, serializer: S) -> Result<S::Ok, S::Error> {
        match self {
            Self::Written(written) => written.serialize(serializer),
            // Whole numbers are written without a point.
            Self::Number(number) if number.fract() == 0.0 && number.abs() < 1e15 => {
                serializer.serialize_i64(*number as i64)
            }
            Self::Number(number) => serializer.serialize_f64(*number),
        }
    }
}

impl<'de> Deserialize<'de> for Measure {
    fn deserialize<D: Deserializer<'de>>(deserializer: D) -> Result<Self, D::Error> {
        struct TextOrNumber;

        impl Visitor<'_> for TextOrNumber {
            type Value = Measure;

            fn expecting(&self, out: &mut fmt::Formatter<'_>) -> fmt::Result {
                write!(out, "{EXPECTED}, or a number under the declared unit")
            }

            fn visit_str<E: serde::de::Error>(self, text: &str) -> Result<Measure, E> {
                Measure::parse(text).map_err(E::custom)
            }

            fn visit_f64<E: serde::de::Error>(self, number: f64) -> Result<Measure, E> {
                Ok(Measure::Number(number))
            }

            fn visit_i64<E: serde::de::Error>(self, number: i64) -> Result<Measure, E> {
                Ok(Measure::Number(number as f64))
            }

            fn visit_u64<E: serde::de::Error>(self, number: u64) -> Result<Measure, E> {
                Ok(Measure::Number(number as f64))
            }
        }

        deserializer.deserialize_any(TextOrNumber)
    }
}
