//! Hydraulic loads, collected downstream.

mod bathroom_group;
mod collect;
mod stack_load;
mod vent_load;

pub use collect::Loads;
pub use stack_load::StackLoads;
pub use vent_load::{VentLoads, WetLoads};

/// Sets a column to `count` times `value` and keeps its memory.
pub(crate) fn refill<T: Clone>(column: &mut Vec<T>, count: usize, value: T) {
    column.clear();
    column.resize(count, value);
}
