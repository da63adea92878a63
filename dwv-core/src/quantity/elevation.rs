//! Heights above the datum of a drawing.

use std::fmt::Display;
use std::ops::{Add, Sub};

use super::length::{Length, LengthUnit};

/// A height above the datum of a drawing, below it negative.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash, Default)]
pub struct Elevation(pub Length);

impl Elevation {
    /// The exact elevation in a unit.
    #[must_use]
    pub fn in_unit(self, unit: LengthUnit) -> impl Display {
        self.0.in_unit(unit)
    }

    /// The elevation as schedules show it.
    #[must_use]
    pub fn rounded(self, unit: LengthUnit) -> impl Display {
        self.0.rounded(unit)
    }
}

impl Add<Length> for Elevation {
    type Output = Self;

    fn add(self, rise: Length) -> Self {
        Self(self.0 + rise)
    }
}

impl Sub<Length> for Elevation {
    type Output = Self;

    fn sub(self, fall: Length) -> Self {
        Self(self.0 - fall)
    }
}

impl Sub for Elevation {
    type Output = Length;

    fn sub(self, other: Self) -> Length {
        self.0 - other.0
    }
}
