//! Slopes, falls and inverts, worked back from the sewer connection.

use crate::loading::refill;
use crate::network::{DrainId, Network};
use crate::quantity::{Elevation, Length, Slope};
use crate::sizing::{Operands, Sizes, slope_at};

/// The grade of every drain, as columns.
#[derive(Debug, Clone, Default)]
pub struct Grades {
    /// The slope; none for vertical pipe.
    pub slope: Vec<Option<Slope>>,
    /// The fall from its upper to its lower end; none when the drawing does not tell its length.
    pub fall: Vec<Option<Length>>,
    /// The invert at its upper end; none when that, or the sewer's invert, cannot be known.
    pub invert_up: Vec<Option<Elevation>>,
    /// The invert at its lower end.
    pub invert_down: Vec<Option<Elevation>>,
}

impl Grades {
    /// Grades everything: at the slope that is drawn, else at the least that the edition allows. At a joint all inverts are one.
    pub fn find(&mut self, operands: &Operands<'_>, sizes: &Sizes) {
        let Network { drains, sewer_invert, .. } = operands.network;
        let count = drains.len();
        refill(&mut self.slope, count, None);
        refill(&mut self.fall, count, None);
        refill(&mut self.invert_up, count, None);
        refill(&mut self.invert_down, count, None);
        for index in (0..count).rev() {
            if drains.vertical[index] {
                self.fall[index] = drains.drop[index];
            } else {
                let slope = slope_at(operands, index, sizes.drain[index]);
                self.slope[index] = Some(slope);
                self.fall[index] = drains.drop[index].or_else(|| Some(slope.fall_over(drains.length[index]?)));
            }
            let down = match drains.next[index].map(DrainId::index) {
                Some(next) => self.invert_up[next],
                None => *sewer_invert,
            };
            self.invert_down[index] = down;
            self.invert_up[index] = down.zip(self.fall[index]).map(|(down, fall)| down + fall);
        }
    }
}
