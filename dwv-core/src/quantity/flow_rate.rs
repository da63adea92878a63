//! Flow in whole picolitres per second.

use std::fmt;

use super::decimal::{divide, leading};
use super::error::{QuantityError, shown};
use super::written::{Quantity, Written};

/// A flow of water. One US gallon is 231 cubic inches, so that US gallons per minute are exact too.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash, Default)]
pub struct FlowRate(u64);

/// A unit that flows are written in.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum FlowUnit {
    /// `L/s`
    LitresPerSecond,
    /// `L/min`
    LitresPerMinute,
    /// `US gpm`
    UsGallonsPerMinute,
}

const WHAT: &str = "flow";
const EXPECTED: &str = "a number with L/s, L/min or US gpm";

impl FlowUnit {
    /// Picolitres per minute in one of the unit.
    fn picolitres_per_minute(self) -> i128 {
        match self {
            Self::LitresPerSecond => 60_000_000_000_000,
            Self::LitresPerMinute => 1_000_000_000_000,
            Self::UsGallonsPerMinute => 3_785_411_784_000,
        }
    }

    fn symbol(self) -> &'static str {
        match self {
            Self::LitresPerSecond => "L/s",
            Self::LitresPerMinute => "L/min",
            Self::UsGallonsPerMinute => "US gpm",
        }
    }
}

impl FlowRate {
    /// A flow of so many picolitres per second.
    #[must_use]
    pub const fn from_picolitres_per_second(flow: u64) -> Self {
        Self(flow)
    }

    /// The flow in picolitres per second.
    #[must_use]
    pub const fn picolitres_per_second(self) -> u64 {
        self.0
    }

    /// Reads a flow with its unit: `0.3 L/s`, `18 L/min`, `5 US gpm`.
    ///
    /// # Errors
    /// A text without a number or unit, an unknown unit, more than 1000 L/s.
    pub fn parse(text: &str) -> Result<Written<Self>, QuantityError> {
        if text.trim().is_empty() {
            return Err(QuantityError::Empty { what: WHAT, expected: EXPECTED });
        }
        let unreadable = || QuantityError::Unreadable { what: WHAT, input: shown(text), expected: EXPECTED };
        let (value, rest) = leading(text.trim()).ok_or_else(unreadable)?;
        let unit = match rest.trim() {
            "L/s" | "l/s" => FlowUnit::LitresPerSecond,
            "L/min" | "l/min" => FlowUnit::LitresPerMinute,
            "US gpm" | "gpm" => FlowUnit::UsGallonsPerMinute,
            "" => return Err(QuantityError::MissingUnit { what: WHAT, input: shown(text), expected: EXPECTED }),
            other => {
                let (input, unit) = (shown(text), shown(other));
                return Err(QuantityError::UnknownUnit { what: WHAT, input, unit, expected: EXPECTED });
            }
        };
        let flow = value.times(unit.picolitres_per_minute()).and_then(|minute| divide(minute, 60));
        let flow = flow.and_then(|flow| u64::try_from(flow).ok()).filter(|flow| *flow <= 1_000_000_000_000_000);
        flow.map(|flow| Written::new(Self(flow), unit)).ok_or_else(|| QuantityError::OutOfRange {
            what: WHAT,
            input: shown(text),
            expected: "at most 1000 L/s",
        })
    }
}

impl Quantity for FlowRate {
    type Notation = FlowUnit;
    const EXPECTED: &'static str = EXPECTED;

    fn read(text: &str) -> Result<Written<Self>, QuantityError> {
        Self::parse(text)
    }

    fn write(self, notation: FlowUnit, out: &mut fmt::Formatter<'_>) -> fmt::Result {
        // The shortest decimal that reads back to the same flow.
        let unit = notation.picolitres_per_minute();
        let minute = i128::from(self.0) * 60;
        for places in 0..=13 {
            let power = 10_i128.pow(places);
            let shown = divide(minute * power, unit).unwrap_or(0);
            let back = divide(shown * unit, power).and_then(|minute| divide(minute, 60));
            if back == Some(i128::from(self.0)) || places == 13 {
                write!(out, "{}", shown / power)?;
                if places > 0 {
                    write!(out, ".{:0width$}", shown % power, width = places as usize)?;
                }
                break;
            }
        }
        write!(out, " {}", notation.symbol())
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn reads_and_writes_flows() {
        for text in ["0.3 L/s", "18 L/min", "5 US gpm", "0.063 L/s"] {
            assert_eq!(FlowRate::parse(text).unwrap().to_string(), text);
        }
        assert_eq!(FlowRate::parse("1 gpm").unwrap().value.picolitres_per_second(), 63_090_196_400);
        assert!(FlowRate::parse("3").unwrap_err().to_string().contains("no unit"));
        assert!(FlowRate::parse("3 m").unwrap_err().to_string().contains("unknown unit"));
    }
}
