//! Places and lengths: what is stated, what follows from positions and heights, and where the two contradict.

use super::Storey;
use crate::error::{Fault, FaultCode, Faults};
use crate::layout::limits::{self, Bound};
use crate::layout::{Drain, Position, Runs, Vent};
use crate::quantity::{Length, LengthUnit, Measure, Slope};

/// Where a fixture, joint, terminal or valve is, as far as it is known.
#[derive(Debug, Clone, Copy)]
pub(super) struct Place {
    pub(super) elevation: Option<Length>,
    pub(super) height_stated: bool,
    pub(super) at: Option<[Length; 2]>,
    pub(super) storey: Option<Storey>,
}

impl Place {
    pub(super) const UNKNOWN: Self = Self { elevation: None, height_stated: false, at: None, storey: None };
}

/// Reads the measures of a drawing under its declared unit.
#[derive(Debug, Clone, Copy)]
pub(super) struct Reader {
    pub(super) unit: Option<LengthUnit>,
}

impl Reader {
    /// The length that `measure` states, when it can be read and is within `bound`.
    pub(super) fn read(
        self,
        measure: Option<Measure>,
        bound: &Bound,
        path: impl Fn() -> String,
        faults: &mut Faults,
    ) -> Option<Length> {
        match measure?.resolve(self.unit) {
            Ok(value) if bound.holds(value) => Some(value),
            Ok(value) => {
                let unit = self.unit.unwrap_or(LengthUnit::Metre);
                let message = format!(
                    "{} cannot be `{}`, expected {} to {}",
                    bound.what,
                    value.in_unit(unit),
                    bound.least.in_unit(unit),
                    bound.most.in_unit(unit)
                );
                faults.push(Fault::new(FaultCode::OutOfRange, path(), message).help("check the sign and the unit"));
                None
            }
            Err(error) => {
                faults.push(Fault::new(FaultCode::WrongQuantity, path(), error.to_string()));
                None
            }
        }
    }

    pub(super) fn position(
        self,
        at: Option<Position>,
        path: impl Fn() -> String,
        faults: &mut Faults,
    ) -> Option<[Length; 2]> {
        let [x, y] = at?;
        let x = self.read(Some(x), &limits::COORDINATE, || format!("{}.at[0]", path()), faults);
        let y = self.read(Some(y), &limits::COORDINATE, || format!("{}.at[1]", path()), faults);
        Some([x?, y?])
    }
}

/// How far apart two places are on the plan.
fn plan_distance(from: &Place, to: &Place) -> Option<Length> {
    let ([x1, y1], [x2, y2]) = (from.at?, to.at?);
    Some(hypotenuse(x1 - x2, y1 - y2))
}

/// The hypotenuse, to the nearest nanometre below.
fn hypotenuse(a: Length, b: Length) -> Length {
    let square = |length: Length| i128::from(length.nanometres()) * i128::from(length.nanometres());
    Length::from_nanometres(i64::try_from((square(a) + square(b)).isqrt()).unwrap_or(i64::MAX))
}

/// The geometry of one drain.
#[derive(Debug, Clone, Copy)]
pub(super) struct Run {
    pub(super) length: Option<Length>,
    pub(super) drop: Option<Length>,
    pub(super) slope: Option<Slope>,
    pub(super) vertical: bool,
    pub(super) top: Length,
    pub(super) foot: Length,
}

/// What is known about one drain before its geometry is worked out.
pub(super) struct DrainEnds<'a> {
    pub(super) drain: &'a Drain,
    pub(super) path: usize,
    pub(super) from: Place,
    pub(super) to: Place,
}

impl DrainEnds<'_> {
    pub(super) fn run(&self, reader: Reader, faults: &mut Faults) -> Run {
        let (drain, path) = (self.drain, format!("drains[{}]", self.path));
        let length = reader.read(drain.length, &limits::PIPE_LENGTH, || format!("{path}.length"), faults);
        let drop = reader.read(drain.drop, &limits::PIPE_DROP, || format!("{path}.drop"), faults);
        let plan = plan_distance(&self.from, &self.to);
        let top = self.from.elevation.unwrap_or(Length::ZERO);
        let end = self.to.elevation.unwrap_or(Length::ZERO);
        match drain.runs {
            Runs::Level => self.level(length, plan, top, end, faults),
            Runs::Vertical => self.vertical(length, drop, plan, top, end, faults),
            Runs::Sloped => self.sloped(length, drop, plan, top, end, faults),
        }
    }

    /// An end that is not there is told elsewhere, and nothing follows from its height.
    fn ends_known(&self) -> bool {
        self.from.elevation.is_some() && self.to.elevation.is_some()
    }

    fn fault(&self, code: FaultCode, key: &str, message: String) -> Fault {
        Fault::new(code, format!("drains[{}].{key}", self.path), message).of(&self.drain.id)
    }

    fn level(
        &self,
        length: Option<Length>,
        plan: Option<Length>,
        top: Length,
        foot: Length,
        faults: &mut Faults,
    ) -> Run {
        if self.drain.drop.is_some() {
            let message = "a level drain takes a slope and no drop".to_owned();
            let help = "say `\"runs\": \"sloped\"`, or state `slope`";
            faults.push(self.fault(FaultCode::Contradiction, "drop", message).help(help));
        }
        self.check_reach(length, plan, faults);
        self.check_level(length.or(plan), top, foot, faults);
        let slope = self.drain.slope.map(|slope| slope.value);
        Run { length: length.or(plan), drop: None, slope, vertical: false, top, foot: foot.min(top) }
    }

    /// A drain that is drawn level although its ends are at quite different heights. The grade itself is not drawn.
    fn check_level(&self, length: Option<Length>, top: Length, end: Length, faults: &mut Faults) {
        let heights_stated = self.from.height_stated && self.to.height_stated;
        if !self.ends_known() || (!heights_stated && self.from.storey == self.to.storey) {
            return;
        }
        let ends = || {
            let (top, end) = (top.rounded(LengthUnit::Metre), end.rounded(LengthUnit::Metre));
            format!("`{}` at {top} and `{}` at {end}", self.drain.from, self.drain.to)
        };
        if end - top > limits::DRAWING_TOLERANCE {
            let message = format!("a drain does not go up, but it is drawn from {}", ends().replace(" and ", " to "));
            let help = "swap `from` and `to`, or correct the heights of the two";
            faults.push(self.fault(FaultCode::GoesUp, "to", message).help(help));
        } else if top - end > length.unwrap_or(limits::LEVEL_DROP).max(limits::LEVEL_DROP) {
            let message = format!("it is drawn level, but it drops farther than it is long, between {}", ends());
            let help = "say `\"runs\": \"vertical\"` or `\"sloped\"`, or correct the heights of the two";
            faults.push(self.fault(FaultCode::Contradiction, "runs", message).help(help));
        }
    }

    /// A stated length that is shorter than the way between the ends on the plan.
    fn check_reach(&self, length: Option<Length>, plan: Option<Length>, faults: &mut Faults) {
        if let (Some(length), Some(plan)) = (length, plan)
            && length + limits::DRAWING_TOLERANCE < plan
        {
            let message = format!(
                "the stated length {} is shorter than the {} between its ends on the plan",
                length.rounded(LengthUnit::Metre),
                plan.rounded(LengthUnit::Metre)
            );
            let help = "leave `length` out to take it from the positions, or correct one of them";
            faults.push(self.fault(FaultCode::Contradiction, "length", message).help(help));
        }
    }

    fn vertical(
        &self,
        length: Option<Length>,
        drop: Option<Length>,
        plan: Option<Length>,
        top: Length,
        end: Length,
        faults: &mut Faults,
    ) -> Run {
        if self.drain.slope.is_some() {
            let message = "a vertical drain takes a drop and no slope".to_owned();
            let help = "say `\"runs\": \"sloped\"`, or leave `slope` out";
            faults.push(self.fault(FaultCode::Contradiction, "slope", message).help(help));
        }
        let drawn = top - end;
        let stated = drop.or(length);
        let heights_stated = self.from.height_stated && self.to.height_stated;
        if self.ends_known() && (drawn.is_negative() || (stated.is_none() && drawn == Length::ZERO)) {
            let message = format!(
                "a vertical drain goes down, but `{}` at {} is not below `{}` at {}",
                self.drain.to,
                end.rounded(LengthUnit::Metre),
                self.drain.from,
                top.rounded(LengthUnit::Metre)
            );
            let help = "swap `from` and `to`, correct the heights of the two, or state `drop`";
            faults.push(self.fault(FaultCode::GoesUp, "to", message).help(help));
        }
        if let (Some(length), Some(drop)) = (length, drop)
            && length + limits::DRAWING_TOLERANCE < drop
        {
            let message = format!(
                "the stated length {} is shorter than the stated drop {}",
                length.rounded(LengthUnit::Metre),
                drop.rounded(LengthUnit::Metre)
            );
            faults.push(self.fault(FaultCode::Contradiction, "length", message).help("correct one of the two"));
        }
        if let Some(stated) = stated
            && heights_stated
            && !drawn.is_negative()
            && (stated - drawn).abs() > limits::DRAWING_TOLERANCE
        {
            let message = format!(
                "it is stated to be {} high, but its ends are {} apart in height",
                stated.rounded(LengthUnit::Metre),
                drawn.rounded(LengthUnit::Metre)
            );
            let key = if drop.is_some() { "drop" } else { "length" };
            let help = "leave it out to take it from the heights, or correct one of them";
            faults.push(self.fault(FaultCode::Contradiction, key, message).help(help));
        }
        let fall = stated.unwrap_or(drawn).max(Length::ZERO);
        if let Some(plan) = plan
            && plan > fall + limits::DRAWING_TOLERANCE
        {
            let message = format!(
                "it is drawn vertical, but its ends are {} apart on the plan and only {} in height",
                plan.rounded(LengthUnit::Metre),
                fall.rounded(LengthUnit::Metre)
            );
            let help = "correct the positions, or say `\"runs\": \"sloped\"`";
            faults.push(self.fault(FaultCode::Contradiction, "runs", message).help(help));
        }
        let foot = end.min(top - fall);
        Run { length: Some(length.unwrap_or(fall)), drop: Some(fall), slope: None, vertical: true, top, foot }
    }

    fn sloped(
        &self,
        length: Option<Length>,
        drop: Option<Length>,
        plan: Option<Length>,
        top: Length,
        end: Length,
        faults: &mut Faults,
    ) -> Run {
        self.check_reach(length, plan, faults);
        let stated_slope = self.drain.slope.map(|slope| slope.value);
        if drop.is_some() && stated_slope.is_some() {
            let message = "a sloped drain takes a drop or a slope, not both".to_owned();
            faults.push(self.fault(FaultCode::Contradiction, "slope", message).help("leave one of the two out"));
        }
        let drawn = (top - end > Length::ZERO).then_some(top - end);
        let run = length.or(plan);
        let by_slope = stated_slope.and_then(|slope| Some(slope.fall_over(run?)));
        let fall = match (drop, stated_slope) {
            (Some(drop), _) => Some(drop),
            (None, Some(_)) => by_slope,
            (None, None) => drawn,
        };
        if fall.is_none() && stated_slope.is_none() {
            let message = "a sloped drain needs a drop or a slope".to_owned();
            let help = "state `drop` or `slope`, or say `\"runs\": \"level\"` to have the grade chosen";
            faults.push(self.fault(FaultCode::MissingKey, "slope", message).help(help));
        }
        let length = length.or_else(|| Some(hypotenuse(plan?, fall?))).or(plan);
        // Within 45° of the vertical: the drop is at least as long as the way on the plan.
        let vertical = match (fall, length) {
            (Some(fall), Some(length)) => {
                let square = |length: Length| i128::from(length.nanometres()) * i128::from(length.nanometres());
                length > Length::ZERO && 2 * square(fall) >= square(length)
            }
            _ => false,
        };
        let slope = stated_slope.or_else(|| Slope::from_fall(fall?, length?)).filter(|_| !vertical);
        let foot = end.min(top - fall.unwrap_or(Length::ZERO));
        Run { length, drop: fall, slope, vertical, top, foot }
    }
}

/// The developed length of a vent: as stated, else along the plan and then up or down.
pub(super) fn vent_length(
    vent: &Vent,
    path: &str,
    from: &Place,
    to: &Place,
    reader: Reader,
    faults: &mut Faults,
) -> Option<Length> {
    let stated = reader.read(vent.length, &limits::PIPE_LENGTH, || format!("{path}.length"), faults);
    let plan = plan_distance(from, to);
    let rise = from.elevation.zip(to.elevation).map(|(from, to)| (to - from).abs());
    let drawn_rise = rise.filter(|_| from.height_stated && to.height_stated).unwrap_or(Length::ZERO);
    let straight = hypotenuse(plan.unwrap_or(Length::ZERO), drawn_rise);
    if let Some(stated) = stated
        && stated + limits::DRAWING_TOLERANCE < straight
    {
        let message = format!(
            "the stated length {} is shorter than the {} between its ends",
            stated.rounded(LengthUnit::Metre),
            straight.rounded(LengthUnit::Metre)
        );
        let help = "leave `length` out to take it from positions and heights, or correct one of them";
        let fault = Fault::new(FaultCode::Contradiction, format!("{path}.length"), message);
        faults.push(fault.of(&vent.id).help(help));
    }
    stated.or_else(|| Some(plan? + rise?))
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn a_three_four_five_triangle_is_exact() {
        let (three, four) = (Length::from_millimetres(3000), Length::from_millimetres(4000));
        assert_eq!(hypotenuse(three, four), Length::from_millimetres(5000));
    }
}
