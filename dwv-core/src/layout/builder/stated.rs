//! What may be written where a quantity is asked for.

use crate::quantity::{
    FixtureUnits, FlowRate, Length, LengthUnit, Measure, PipeSize, Quantity, QuantityError, Slope, SlopeNotation,
    Written,
};

/// Something that states a quantity `Q`: the quantity itself, a text such as `"3'-6 1/2\""`, or a number where the
/// format takes one.
pub trait Stated<Q> {
    /// The quantity.
    ///
    /// # Errors
    /// A text or a number that is no such quantity.
    fn read(self) -> Result<Q, QuantityError>;
}

impl<Q> Stated<Q> for Q {
    fn read(self) -> Result<Q, QuantityError> {
        Ok(self)
    }
}

impl<Q: Quantity> Stated<Written<Q>> for &str {
    fn read(self) -> Result<Written<Q>, QuantityError> {
        Q::read(self)
    }
}

impl<Q> Stated<Q> for &String
where
    for<'a> &'a str: Stated<Q>,
{
    fn read(self) -> Result<Q, QuantityError> {
        self.as_str().read()
    }
}

impl Stated<Measure> for &str {
    fn read(self) -> Result<Measure, QuantityError> {
        Measure::parse(self)
    }
}

/// A number counts in the declared unit.
impl Stated<Measure> for f64 {
    fn read(self) -> Result<Measure, QuantityError> {
        if self.is_finite() {
            return Ok(Measure::Number(self));
        }
        Err(QuantityError::OutOfRange { what: "length", input: self.to_string(), expected: "a finite number" })
    }
}

/// A number counts in the declared unit.
impl Stated<Measure> for i32 {
    fn read(self) -> Result<Measure, QuantityError> {
        Ok(Measure::Number(f64::from(self)))
    }
}

impl Stated<Measure> for Length {
    fn read(self) -> Result<Measure, QuantityError> {
        Ok(Measure::Written(Written::new(self, LengthUnit::Metre)))
    }
}

impl Stated<Measure> for Written<Length> {
    fn read(self) -> Result<Measure, QuantityError> {
        Ok(Measure::Written(self))
    }
}

impl Stated<PipeSize> for &str {
    fn read(self) -> Result<PipeSize, QuantityError> {
        PipeSize::parse(self)
    }
}

impl Stated<PipeSize> for f64 {
    fn read(self) -> Result<PipeSize, QuantityError> {
        PipeSize::parse(&self.to_string())
    }
}

impl Stated<PipeSize> for i32 {
    fn read(self) -> Result<PipeSize, QuantityError> {
        PipeSize::parse(&self.to_string())
    }
}

impl Stated<FixtureUnits> for &str {
    fn read(self) -> Result<FixtureUnits, QuantityError> {
        FixtureUnits::parse(self)
    }
}

impl Stated<FixtureUnits> for f64 {
    fn read(self) -> Result<FixtureUnits, QuantityError> {
        FixtureUnits::from_number(self)
    }
}

impl Stated<FixtureUnits> for i32 {
    fn read(self) -> Result<FixtureUnits, QuantityError> {
        FixtureUnits::from_number(f64::from(self))
    }
}

/// A slope without a notation is written as a ratio.
impl Stated<Written<Slope>> for Slope {
    fn read(self) -> Result<Written<Slope>, QuantityError> {
        Ok(Written::new(self, SlopeNotation::Ratio))
    }
}

/// A flow without a unit is written in litres per second.
impl Stated<Written<FlowRate>> for FlowRate {
    fn read(self) -> Result<Written<FlowRate>, QuantityError> {
        Ok(Written::new(self, crate::quantity::FlowUnit::LitresPerSecond))
    }
}
