//! A quantity together with the way it was written.

use std::fmt::{self, Debug, Display};
use std::marker::PhantomData;

use serde::de::Visitor;
use serde::{Deserialize, Deserializer, Serialize, Serializer};

use super::error::QuantityError;

/// A quantity that can be read from text and written as it was.
pub trait Quantity: Copy + Eq {
    /// The ways it can be written.
    type Notation: Copy + Eq + Debug;
    /// What a reader should write, for messages.
    const EXPECTED: &'static str;

    /// Reads it from text.
    ///
    /// # Errors
    /// A text that is no such quantity.
    fn read(text: &str) -> Result<Written<Self>, QuantityError>;

    /// Writes it exactly.
    ///
    /// # Errors
    /// Only those of the formatter.
    fn write(self, notation: Self::Notation, out: &mut fmt::Formatter<'_>) -> fmt::Result;
}

/// A quantity with the notation that it was typed in.
#[derive(Clone, Copy, PartialEq, Eq, Debug)]
pub struct Written<Q: Quantity> {
    /// The exact value.
    pub value: Q,
    /// How it was typed.
    pub notation: Q::Notation,
}

impl<Q: Quantity> Written<Q> {
    /// A value to be written in a notation.
    #[must_use]
    pub fn new(value: Q, notation: Q::Notation) -> Self {
        Self { value, notation }
    }
}

impl<Q: Quantity> Display for Written<Q> {
    fn fmt(&self, out: &mut fmt::Formatter<'_>) -> fmt::Result {
        self.value.write(self.notation, out)
    }
}

impl<Q: Quantity> Serialize for Written<Q> {
    fn serialize<S: Serializer>(&self, serializer: S) -> Result<S::Ok, S::Error> {
        serializer.collect_str(self)
    }
}

impl<'de, Q: Quantity> Deserialize<'de> for Written<Q> {
    fn deserialize<D: Deserializer<'de>>(deserializer: D) -> Result<Self, D::Error> {
        struct Text<Q>(PhantomData<Q>);

        impl<Q: Quantity> Visitor<'_> for Text<Q> {
            type Value = Written<Q>;

            fn expecting(&self, out: &mut fmt::Formatter<'_>) -> fmt::Result {
                out.write_str(Q::EXPECTED)
            }

            fn visit_str<E: serde::de::Error>(self, text: &str) -> Result<Self::Value, E> {
                Q::read(text).map_err(E::custom)
            }
        }

        deserializer.deserialize_str(Text(PhantomData))
    }
}
