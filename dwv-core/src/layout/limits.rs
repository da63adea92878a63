//! Every numeric bound of a drawing, in one place.

use crate::quantity::Length;

/// A bound with the words that messages use for it.
#[derive(Debug, Clone, Copy)]
pub struct Bound {
    /// What is bounded.
    pub what: &'static str,
    /// The least that is accepted.
    pub least: Length,
    /// The most that is accepted.
    pub most: Length,
}

impl Bound {
    /// Whether `value` is within the bound.
    #[must_use]
    pub fn holds(&self, value: Length) -> bool {
        self.least <= value && value <= self.most
    }
}

const fn metres(value: i64) -> Length {
    Length::from_millimetres(value * 1000)
}

/// The length of one pipe.
pub const PIPE_LENGTH: Bound = Bound { what: "the length of a pipe", least: Length::ZERO, most: metres(1000) };
/// The drop of one pipe.
pub const PIPE_DROP: Bound = Bound { what: "the drop of a pipe", least: Length::ZERO, most: metres(300) };
/// The height of a floor or an invert about the datum.
pub const ELEVATION: Bound = Bound { what: "an elevation", least: metres(-10_000), most: metres(10_000) };
/// The height of an element above the floor of its level.
pub const HEIGHT: Bound = Bound { what: "a height above the floor", least: metres(-300), most: metres(300) };
/// A coordinate on the plan.
pub const COORDINATE: Bound =
    Bound { what: "a coordinate on the plan", least: metres(-100_000), most: metres(100_000) };
/// The most levels of one layout.
pub const MOST_LEVELS: usize = 200;
/// The most elements of one kind in one layout.
pub const MOST_ELEMENTS: usize = 4_000_000;
/// The longest id, in bytes.
pub const LONGEST_ID: usize = 64;
/// The largest load of one fixture, in thousandths of a fixture unit.
pub const MOST_LOAD_THOUSANDTHS: u64 = 10_000_000;
/// How far a stated length or drop may fall short of what positions give before it is a contradiction.
pub const DRAWING_TOLERANCE: Length = Length::from_millimetres(5);
/// How far a short level drain may drop on the drawing before it is a contradiction; a longer one as far as it is long.
pub const LEVEL_DROP: Length = Length::from_millimetres(300);
