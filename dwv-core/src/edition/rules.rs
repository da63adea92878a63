//! Rules with their parameters.

use serde::Deserialize;

use super::{CitationId, Cited};
use crate::quantity::{FixtureUnits, Length, PipeSize, Slope};

/// From a count on, a least size.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Deserialize)]
#[serde(deny_unknown_fields)]
pub struct SizeFrom {
    /// The count from which it holds.
    pub count: u32,
    /// The least size.
    pub least: PipeSize,
}

/// A least slope up to a size, or from a size on.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct SlopeFrom {
    /// The size.
    pub size: PipeSize,
    /// The slope.
    pub slope: Slope,
}

/// Limits of every trap arm beside its longest length.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Deserialize)]
#[serde(deny_unknown_fields)]
pub struct ArmLimits {
    /// The least length in pipe sizes.
    pub least_sizes: u32,
    /// The most fall in inside diameters.
    pub most_fall_diameters: u32,
    /// The most turn in degrees.
    pub most_turn: u16,
}

/// Limits of the trap arm of a siphonic fixture.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct SiphonicArmLimits {
    /// The most drop to the vent.
    pub most_vertical: Length,
    /// The most horizontal length to the vent.
    pub most_horizontal: Length,
    /// The most turn in degrees.
    pub most_turn: u16,
}

/// When the trap of a floor drain needs no vent.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct FloorDrainExemption {
    /// The least trap.
    pub least_trap: PipeSize,
    /// The least length of its fixture drain.
    pub least_length: Length,
    /// The most fall of its fixture drain in pipe sizes.
    pub most_fall_sizes: u32,
}

/// What frost asks of a vent that passes the roof.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Deserialize)]
#[serde(deny_unknown_fields)]
pub struct Frost {
    /// How many sizes larger.
    pub sizes_larger: u32,
    /// The least size.
    pub least: PipeSize,
}

/// A rule as data has it: its name, its parameter in words, its citation.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct RuleText {
    /// The name.
    pub name: String,
    /// The parameter in words; empty for a rule without one.
    pub value: String,
    /// Where it comes from.
    pub citation: CitationId,
}

/// The rules of an edition. What each one says stands in its citation.
#[derive(Debug, Clone)]
#[allow(missing_docs)]
pub struct Rules {
    pub total_load: Cited<()>,
    pub unlisted_fixture: Cited<()>,
    pub continuous_flow: Cited<FixtureUnits>,
    pub bathroom_group: Cited<()>,
    pub no_smaller_than_upstream: Cited<()>,
    pub water_closet_least: Cited<PipeSize>,
    pub third_water_closet: Cited<SizeFrom>,
    pub stack_water_closets: Cited<SizeFrom>,
    pub building_sewer_least: Cited<PipeSize>,
    pub building_drain_underground_least: Cited<PipeSize>,
    pub building_sewer_begins: Cited<Length>,
    pub stack_offset: Cited<Length>,
    pub storey_allowance: Cited<Length>,
    pub least_slope_small: Cited<SlopeFrom>,
    pub least_slope_large: Cited<SlopeFrom>,
    pub trap_is_outlet: Cited<()>,
    pub outlet_pipe_longest: Cited<Length>,
    pub trap_arm: Cited<ArmLimits>,
    pub trap_arm_siphonic: Cited<SiphonicArmLimits>,
    pub trap_needs_vent: Cited<()>,
    pub floor_drain_unvented: Cited<FloorDrainExemption>,
    pub wet_vent_water_closets: Cited<u32>,
    pub wet_vent_order: Cited<()>,
    pub wet_vent_arm_most: Cited<PipeSize>,
    pub wet_vent_load: Cited<()>,
    pub wet_vent_upper_storey: Cited<FixtureUnits>,
    pub wet_vent_tall: Cited<u32>,
    pub stack_vent_required: Cited<()>,
    pub vent_stack_required: Cited<u32>,
    pub stack_vent_least_share: Cited<()>,
    pub one_large_vent: Cited<PipeSize>,
    pub vent_no_reduction: Cited<()>,
    pub individual_dual_size: Cited<()>,
    pub branch_vent_inputs: Cited<()>,
    pub stack_vent_inputs: Cited<()>,
    pub vent_frost: Cited<Frost>,
    pub vent_above_roof: Cited<Length>,
    pub vent_above_ground: Cited<Length>,
    pub valve_grounds: Cited<()>,
    pub open_air_vent: Cited<()>,
    /// All rules by name, with their parameters in words.
    pub texts: Vec<RuleText>,
}
