//! Lengths as text. These are the only places that format lengths.

use std::fmt::{self, Display, Write};

use super::decimal::divide;
use super::length::{Length, LengthUnit};

/// Nanometres in 1/64 inch.
const SIXTY_FOURTH: i128 = 396_875;

impl Length {
    /// The exact length in a unit: text that reads back to the same value. Inches that are no multiple of 1/64 are written with
    /// decimals.
    #[must_use]
    pub fn in_unit(self, unit: LengthUnit) -> impl Display {
        LengthText { length: self, unit, exact: true }
    }

    /// The length as schedules show it: metres to the millimetre, millimetres whole, feet to 1/1000, inches to 1/16.
    /// Halves are rounded away from zero.
    #[must_use]
    pub fn rounded(self, unit: LengthUnit) -> impl Display {
        LengthText { length: self, unit, exact: false }
    }
}

#[derive(Debug, Clone, Copy)]
struct LengthText {
    length: Length,
    unit: LengthUnit,
    exact: bool,
}

impl Display for LengthText {
    fn fmt(&self, out: &mut fmt::Formatter<'_>) -> fmt::Result {
        let magnitude = i128::from(self.length.nanometres()).abs();
        let mut text = String::with_capacity(24);
        match (self.unit, self.sixty_fourths(magnitude)) {
            (LengthUnit::FootInch, Some(parts)) => feet_and_inches(&mut text, parts)?,
            (LengthUnit::Inch, Some(parts)) => {
                inches(&mut text, parts)?;
                text.push_str(" in");
            }
            (LengthUnit::FootInch, None) => {
                self.decimal(&mut text, magnitude, LengthUnit::Inch)?;
                text.push('"');
            }
            (unit, _) => {
                self.decimal(&mut text, magnitude, unit)?;
                write!(text, " {}", unit.symbol())?;
            }
        }
        if self.length.is_negative() && text.bytes().any(|byte| (b'1'..=b'9').contains(&byte)) {
            text.insert(0, '-');
        }
        out.pad(&text)
    }
}

impl LengthText {
    /// The magnitude in 1/64 inch: exact, or to the nearest 1/16; none when it is no multiple and must be exact.
    fn sixty_fourths(self, magnitude: i128) -> Option<i128> {
        if self.exact {
            return (magnitude % SIXTY_FOURTH == 0).then_some(magnitude / SIXTY_FOURTH);
        }
        divide(magnitude, SIXTY_FOURTH * 4).map(|sixteenths| sixteenths * 4)
    }

    fn decimal(self, out: &mut String, magnitude: i128, unit: LengthUnit) -> fmt::Result {
        let size = i128::from(unit.nanometres());
        let places = if self.exact {
            (0..=12).find(|places| {
                let power = 10_i128.pow(*places);
                let shown = divide(magnitude * power, size);
                shown.and_then(|shown| divide(shown * size, power)) == Some(magnitude)
            })
        } else {
            Some(match unit {
                LengthUnit::Millimetre => 0,
                LengthUnit::Centimetre => 1,
                _ => 3,
            })
        };
        let places = places.unwrap_or(12);
        let power = 10_i128.pow(places);
        let shown = divide(magnitude * power, size).unwrap_or(0);
        write!(out, "{}", shown / power)?;
        if places > 0 {
            write!(out, ".{:0width$}", shown % power, width = places as usize)?;
        }
        Ok(())
    }
}

/// `42 1/2`, from 1/64 inches.
fn inches(out: &mut String, parts: i128) -> fmt::Result {
    let (whole, mut part, mut of) = (parts / 64, parts % 64, 64);
    while part != 0 && part % 2 == 0 {
        part /= 2;
        of /= 2;
    }
    match (whole, part) {
        (whole, 0) => write!(out, "{whole}"),
        (0, part) => write!(out, "{part}/{of}"),
        (whole, part) => write!(out, "{whole}-{part}/{of}"),
    }
}

/// `3'-6 1/2"`, from 1/64 inches.
fn feet_and_inches(out: &mut String, parts: i128) -> fmt::Result {
    write!(out, "{}'-", parts / 768)?;
    let mut text = String::new();
    inches(&mut text, parts % 768)?;
    out.push_str(&text.replace('-', " "));
    out.push('"');
    Ok(())
}

#[cfg(test)]
mod tests {
    use proptest::prelude::*;

    use super::*;

    fn text(text: &str, unit: LengthUnit) -> String {
        Length::parse(text).unwrap().value.in_unit(unit).to_string()
    }

    #[test]
    fn writes_what_was_typed() {
        for written in ["3'-6 1/2\"", "1.2 m", "450 mm", "9-1/2 in", "12.25 ft", "-0.3 m", "0'-3/4\"", "4.5 cm", "0 m"]
        {
            assert_eq!(Length::parse(written).unwrap().to_string(), written);
        }
    }

    #[test]
    fn rounds_for_schedules() {
        let length = Length::parse("9.1111 ft").unwrap().value;
        assert_eq!(length.rounded(LengthUnit::FootInch).to_string(), "9'-1 5/16\"");
        assert_eq!(length.rounded(LengthUnit::Metre).to_string(), "2.777 m");
        assert_eq!(length.rounded(LengthUnit::Millimetre).to_string(), "2777 mm");
        assert_eq!(Length::from_nanometres(-1).rounded(LengthUnit::Metre).to_string(), "0.000 m");
    }

    #[test]
    fn changes_units_exactly() {
        assert_eq!(text("1 m", LengthUnit::Millimetre), "1000 mm");
        assert_eq!(text("1 in", LengthUnit::Metre), "0.0254 m");
        assert_eq!(text("0.1 mm", LengthUnit::FootInch), "0.003937\"");
    }

    proptest! {
        #[test]
        fn exact_text_reads_back(nanometres in -9_000_000_000_000_i64..9_000_000_000_000) {
            let length = Length::from_nanometres(nanometres);
            for unit in LengthUnit::ALL {
                prop_assert_eq!(Length::parse(&length.in_unit(unit).to_string()).unwrap().value, length);
            }
        }

        #[test]
        fn feet_and_inches_read_back_in_their_notation(parts in -100_000_i64..100_000) {
            let length = Length::from_sixty_fourths(parts);
            let written = length.in_unit(LengthUnit::FootInch).to_string();
            prop_assert_eq!(Length::parse(&written).unwrap().to_string(), written);
        }

        #[test]
        fn no_text_makes_it_panic(text in "\\PC*") {
            let _ = Length::parse(&text);
        }
    }
}
