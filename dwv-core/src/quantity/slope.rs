//! Slopes as ratios of integers: 1:50, 2 %, 1/4 in per ft.

use std::cmp::Ordering;
use std::fmt::{self, Display};
use std::num::NonZeroU32;

use super::decimal::{Fraction, divide, leading};
use super::error::{QuantityError, shown};
use super::length::{Length, LengthUnit};
use super::written::{Quantity, Written};

/// A slope: rise over run, in lowest terms.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub struct Slope {
    rise: u32,
    run: NonZeroU32,
}

/// A way that slopes are written.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum SlopeNotation {
    /// `1:50`
    Ratio,
    /// `2 %`
    Percent,
    /// `1/4 in per ft`
    InchesPerFoot,
    /// `20 mm/m`
    MillimetresPerMetre,
}

const WHAT: &str = "slope";
const EXPECTED: &str = "a slope such as 1:50, 2 %, 1/4 in per ft or 20 mm/m";

impl Slope {
    /// A slope of `rise` in `run`; none when `run` is 0.
    #[must_use]
    pub const fn new(rise: u32, run: u32) -> Option<Self> {
        let (mut a, mut b) = (rise, run);
        while b != 0 {
            (a, b) = (b, a % b);
        }
        if a == 0 {
            return None;
        }
        match NonZeroU32::new(run / a) {
            Some(run) => Some(Self { rise: rise / a, run }),
            None => None,
        }
    }

    /// A slope of one in `run`; one in 0 is taken as one in 1.
    #[must_use]
    pub const fn one_in(run: u32) -> Self {
        match NonZeroU32::new(run) {
            Some(run) => Self { rise: 1, run },
            None => Self { rise: 1, run: NonZeroU32::MIN },
        }
    }

    /// The slope of a pipe that falls `fall` over `over`; none without a length, or when it is steeper than 4000 million to 1.
    #[must_use]
    pub fn from_fall(fall: Length, over: Length) -> Option<Self> {
        let (rise, run) = (fall.nanometres(), over.nanometres());
        if rise < 0 || run <= 0 {
            return None;
        }
        let (mut a, mut b) = (rise, run);
        while b != 0 {
            (a, b) = (b, a % b);
        }
        let (mut rise, mut run) = (rise / a.max(1), run / a.max(1));
        // Lengths in nanometres may have no common measure: keep the thirty-two leading bits, rounded down to the flatter slope.
        while rise > i64::from(u32::MAX) || run > i64::from(u32::MAX) {
            rise /= 2;
            run = (run + 1) / 2;
        }
        Self::new(u32::try_from(rise).ok()?, u32::try_from(run).ok()?)
    }

    /// Rise of the ratio in lowest terms.
    #[must_use]
    pub const fn rise(self) -> u32 {
        self.rise
    }

    /// Run of the ratio in lowest terms.
    #[must_use]
    pub const fn run(self) -> u32 {
        self.run.get()
    }

    /// The fall over a length, to the nearest nanometre, halves away from zero.
    #[must_use]
    pub fn fall_over(self, length: Length) -> Length {
        let fall = divide(i128::from(length.nanometres()) * i128::from(self.rise), i128::from(self.run.get()));
        Length::from_nanometres(fall.and_then(|fall| i64::try_from(fall).ok()).unwrap_or(i64::MAX))
    }

    /// The fall over a length as the trade would write it: in the unit of the length, but in inches where that is feet.
    #[must_use]
    pub fn fall_as_written(self, length: Written<Length>) -> Written<Length> {
        let unit = match length.notation {
            LengthUnit::Foot => LengthUnit::Inch,
            unit => unit,
        };
        Written::new(self.fall_over(length.value), unit)
    }

    /// Reads a slope: `1:50`, `1 in 50`, `2 %`, `1/4 in per ft`, `1/4"/ft`, `20 mm/m`.
    ///
    /// # Errors
    /// A text without a number, an unknown unit, a slope of none or steeper than 1000 to 1.
    pub fn parse(text: &str) -> Result<Written<Self>, QuantityError> {
        if text.trim().is_empty() {
            return Err(QuantityError::Empty { what: WHAT, expected: EXPECTED });
        }
        let unreadable = || QuantityError::Unreadable { what: WHAT, input: shown(text), expected: EXPECTED };
        let (value, rest) = leading(text.trim()).ok_or_else(unreadable)?;
        let rest = rest.trim();
        let (per, notation) = match rest {
            "%" => (100, SlopeNotation::Percent),
            "in per ft" | "in/ft" | "\"/ft" | "\" per ft" | "\"/'" | "in. per ft" | "inch per foot" => {
                (12, SlopeNotation::InchesPerFoot)
            }
            "mm/m" | "mm per m" => (1000, SlopeNotation::MillimetresPerMetre),
            "" => return Err(QuantityError::MissingUnit { what: WHAT, input: shown(text), expected: EXPECTED }),
            other => return Self::ratio(value, other, text).ok_or_else(unreadable)?,
        };
        Self::checked(value, Fraction::whole(per), notation, text)
    }

    /// The `:50` of `1:50` and the `in 50` of `1 in 50`.
    fn ratio(rise: Fraction, rest: &str, text: &str) -> Option<Result<Written<Self>, QuantityError>> {
        let rest = rest.strip_prefix(':').or_else(|| rest.strip_prefix("in "))?;
        let (run, rest) = leading(rest.trim_start())?;
        rest.trim().is_empty().then(|| Self::checked(rise, run, SlopeNotation::Ratio, text))
    }

    fn checked(
        rise: Fraction,
        run: Fraction,
        notation: SlopeNotation,
        text: &str,
    ) -> Result<Written<Self>, QuantityError> {
        let terms = || {
            let up = rise.numerator.checked_mul(run.denominator)?;
            let along = run.numerator.checked_mul(rise.denominator)?;
            let (mut a, mut b) = (up, along);
            while b != 0 {
                (a, b) = (b, a % b);
            }
            let up = u32::try_from(up.checked_div(a)?).ok()?;
            let along = u32::try_from(along.checked_div(a)?).ok()?;
            Self::new(up, along).filter(|slope| slope.rise > 0 && slope.rise / slope.run <= 1000)
        };
        terms().map(|slope| Written::new(slope, notation)).ok_or_else(|| QuantityError::OutOfRange {
            what: WHAT,
            input: shown(text),
            expected: "a slope above 0 and at most 1000:1, with at most 9 digits",
        })
    }

    /// The exact slope in a notation, where that has an end; else to a hundred thousandth.
    #[must_use]
    pub fn in_notation(self, notation: SlopeNotation) -> impl Display {
        SlopeText { slope: self, notation }
    }
}

impl PartialOrd for Slope {
    fn partial_cmp(&self, other: &Self) -> Option<Ordering> {
        Some(self.cmp(other))
    }
}

impl Ord for Slope {
    fn cmp(&self, other: &Self) -> Ordering {
        let left = u64::from(self.rise) * u64::from(other.run.get());
        let right = u64::from(other.rise) * u64::from(self.run.get());
        left.cmp(&right)
    }
}

#[derive(Debug, Clone, Copy)]
struct SlopeText {
    slope: Slope,
    notation: SlopeNotation,
}

impl Display for SlopeText {
    fn fmt(&self, out: &mut fmt::Formatter<'_>) -> fmt::Result {
        let (rise, run) = (i128::from(self.slope.rise), i128::from(self.slope.run.get()));
        let text = match self.notation {
            SlopeNotation::Ratio => format!("{rise}:{run}"),
            SlopeNotation::Percent => format!("{} %", decimal(rise * 100, run)),
            SlopeNotation::MillimetresPerMetre => format!("{} mm/m", decimal(rise * 1000, run)),
            SlopeNotation::InchesPerFoot => {
                let (inches, of) = (rise * 12, run);
                match (0..=6).map(|power| 1_i128 << power).find(|parts| inches * parts % of == 0) {
                    Some(1) => format!("{} in per ft", inches / of),
                    Some(parts) => {
                        let parts_of = inches * parts / of;
                        match parts_of / parts {
                            0 => format!("{parts_of}/{parts} in per ft"),
                            whole => format!("{whole}-{}/{parts} in per ft", parts_of % parts),
                        }
                    }
                    None => format!("{} in per ft", decimal(inches, of)),
                }
            }
        };
        out.pad(&text)
    }
}

/// The shortest decimal for a fraction, cut at five places.
fn decimal(numerator: i128, denominator: i128) -> String {
    for places in 0..=5 {
        let power = 10_i128.pow(places);
        if numerator * power % denominator == 0 || places == 5 {
            let shown = divide(numerator * power, denominator).unwrap_or(0);
            if places == 0 {
                return shown.to_string();
            }
            return format!("{}.{:0width$}", shown / power, shown % power, width = places as usize);
        }
    }
    String::new()
}

impl Quantity for Slope {
    type Notation = SlopeNotation;
    const EXPECTED: &'static str = EXPECTED;

    fn read(text: &str) -> Result<Written<Self>, QuantityError> {
        Self::parse(text)
    }

    fn write(self, notation: SlopeNotation, out: &mut fmt::Formatter<'_>) -> fmt::Result {
        Display::fmt(&self.in_notation(notation), out)
    }
}

#[cfg(test)]
mod tests {
    use proptest::prelude::*;

    use super::*;

    fn slope(text: &str) -> Slope {
        Slope::parse(text).unwrap().value
    }

    #[test]
    fn reads_and_writes_the_ways_of_the_trade() {
        for text in ["1:50", "2 %", "1/4 in per ft", "20 mm/m", "2.083 %", "1-1/2 in per ft", "1 in per ft"] {
            assert_eq!(Slope::parse(text).unwrap().to_string(), text);
        }
        assert_eq!(slope("1 in 50"), Slope::one_in(50));
        assert_eq!(slope("2 %"), Slope::one_in(50));
        assert_eq!(slope("1/4\"/ft"), Slope::one_in(48));
        assert_eq!(slope("0.25 in/ft"), Slope::one_in(48));
        assert!(slope("1/4 in per ft") > slope("1:50"));
    }

    #[test]
    fn refuses_what_is_no_slope() {
        for text in ["", "flat", "1:0", "0 %", "-1:50", "1:", "2", "2 ‰", "99999999999:1"] {
            assert!(Slope::parse(text).is_err(), "{text}");
        }
    }

    /// Fall of a run at 1/4 in per ft: plumbing trade mathematics, rows 4, 8 and 10 ft (a published forum table of falls at a quarter inch
    /// per foot), and 9-1/2 ft (trade mathematics textbook example).
    #[test]
    fn falls_as_worked_examples_give_them() {
        for (run, fall) in [("4 ft", "1 in"), ("8 ft", "2 in"), ("10 ft", "2-1/2 in"), ("9-1/2 ft", "2-3/8 in")] {
            let (run, fall) = (Length::parse(run).unwrap().value, Length::parse(fall).unwrap().value);
            assert_eq!(Slope::one_in(48).fall_over(run), fall);
        }
    }

    #[test]
    fn falls_are_written_in_inches_where_lengths_are_in_feet() {
        let fall = |length: &str| Slope::one_in(48).fall_as_written(Length::parse(length).unwrap()).to_string();
        assert_eq!(
            (fall("9-1/2 ft"), fall("9'-6\""), fall("4.8 m")),
            ("2-3/8 in".into(), "0'-2 3/8\"".into(), "0.1 m".into())
        );
    }

    proptest! {
        #[test]
        fn text_reads_back(rise in 1_u32..500, run in 1_u32..5000) {
            let slope = Slope::new(rise, run).unwrap();
            let text = slope.in_notation(SlopeNotation::Ratio).to_string();
            prop_assert_eq!(Slope::parse(&text).unwrap().value, slope);
        }

        #[test]
        fn a_fall_gives_its_slope_back(run in 1_u32..2000, metres in 1_i64..500) {
            let over = Length::from_millimetres(metres * i64::from(run));
            let slope = Slope::one_in(run);
            prop_assert_eq!(Slope::from_fall(slope.fall_over(over), over), Some(slope));
        }

        #[test]
        fn no_text_makes_it_panic(text in "\\PC*") {
            let _ = Slope::parse(&text);
        }
    }
}
