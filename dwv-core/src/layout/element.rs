//! The elements of a drawing.

use compact_str::CompactString;
use serde::{Deserialize, Serialize};

use super::Id;
use crate::quantity::{FixtureUnits, FlowRate, Measure, PipeSize, Slope, Written};

fn is_false(value: &bool) -> bool {
    !value
}

/// The name of the file format.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Serialize, Deserialize)]
#[cfg_attr(feature = "schema", derive(schemars::JsonSchema))]
pub enum Format {
    /// The first version.
    #[serde(rename = "dwv-layout/1")]
    Version1,
}

/// A place on the plan: two distances from any origin, the same for all levels.
pub type Position = [Measure; 2];

/// A floor of the building.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[cfg_attr(feature = "schema", derive(schemars::JsonSchema))]
#[serde(deny_unknown_fields)]
pub struct Level {
    /// Its id, such as `main`.
    #[cfg_attr(feature = "schema", schemars(with = "String"))]
    pub id: Id,
    /// The height of the finished floor above any datum; below it negative.
    pub floor: Measure,
}

/// A fixture with its trap.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[cfg_attr(feature = "schema", derive(schemars::JsonSchema))]
#[serde(deny_unknown_fields)]
pub struct Fixture {
    /// Its id, such as `KS`.
    #[cfg_attr(feature = "schema", schemars(with = "String"))]
    pub id: Id,
    /// A kind of the edition's fixture table, such as `kitchen-sink`, or `custom`.
    #[cfg_attr(feature = "schema", schemars(with = "String"))]
    pub kind: CompactString,
    /// The level that it stands on.
    #[cfg_attr(feature = "schema", schemars(with = "String"))]
    pub level: Id,
    /// Where its trap is on the plan.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub at: Option<Position>,
    /// The height of the trap weir above the floor of the level; not stated, 0.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub height: Option<Measure>,
    /// The size of the trap; not stated, that of the fixture table.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub trap: Option<PipeSize>,
    /// The load in fixture units, for a custom fixture or where the maker states more than the table.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub load: Option<FixtureUnits>,
    /// The flow of equipment that runs on and on, such as a pump.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub continuous_flow: Option<Written<FlowRate>>,
    /// The flow of equipment that runs now and then for a while, such as a drinking fountain or a cooler.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub semi_continuous_flow: Option<Written<FlowRate>>,
    /// The bathroom group that it belongs to: fixtures of one bathroom share a word here.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    #[cfg_attr(feature = "schema", schemars(with = "Option<String>"))]
    pub group: Option<Id>,
    /// The developed length of the pipe between the fixture's outlet and its trap.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub outlet_length: Option<Measure>,
    /// A fixture that is only provided for; it counts all the same.
    #[serde(default, skip_serializing_if = "is_false")]
    pub future: bool,
}

/// A place where pipes meet.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[cfg_attr(feature = "schema", derive(schemars::JsonSchema))]
#[serde(deny_unknown_fields)]
pub struct Joint {
    /// Its id, such as `J1`.
    #[cfg_attr(feature = "schema", schemars(with = "String"))]
    pub id: Id,
    /// The level that it belongs to: what joins a stack here counts for this storey.
    #[cfg_attr(feature = "schema", schemars(with = "String"))]
    pub level: Id,
    /// Where it is on the plan.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub at: Option<Position>,
    /// Its height above the floor of the level, under it negative; not stated, 0.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub height: Option<Measure>,
}

/// How a pipe runs.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash, Serialize, Deserialize)]
#[cfg_attr(feature = "schema", derive(schemars::JsonSchema))]
#[serde(rename_all = "kebab-case")]
pub enum Runs {
    /// Nominally level, at the grade that the code asks or that is stated.
    Level,
    /// Straight down, or within 45° of it.
    Vertical,
    /// At a stated drop or slope, which decides whether it counts as horizontal or vertical.
    Sloped,
}

/// A name that the user states for a pipe. A name that the drawing contradicts is a finding.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash, Serialize, Deserialize)]
#[cfg_attr(feature = "schema", derive(schemars::JsonSchema))]
#[serde(rename_all = "kebab-case")]
pub enum StatedName {
    /// From a trap to the place where its air is admitted.
    TrapArm,
    /// From a trap to where it meets other waste.
    FixtureDrain,
    /// Between fixture drains and a stack or the building drain.
    Branch,
    /// A vertical line through at least one storey.
    Stack,
    /// The lowest horizontal piping inside.
    BuildingDrain,
    /// The piping outside.
    BuildingSewer,
    /// A vent of one trap.
    IndividualVent,
    /// A vent of two traps that meet at it.
    DualVent,
    /// A vent that carries on from a drain that serves as a wet vent.
    ContinuousVent,
    /// A vent in which minor vents meet.
    BranchVent,
    /// The dry top of a stack.
    StackVent,
    /// A vent beside a stack.
    VentStack,
    /// A vent in which stack vents or vent stacks meet.
    VentHeader,
}

/// A pipe that carries waste, drawn in the direction of flow.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[cfg_attr(feature = "schema", derive(schemars::JsonSchema))]
#[serde(deny_unknown_fields)]
pub struct Drain {
    /// Its id, such as `d1`.
    #[cfg_attr(feature = "schema", schemars(with = "String"))]
    pub id: Id,
    /// The fixture or joint where it begins.
    #[cfg_attr(feature = "schema", schemars(with = "String"))]
    pub from: Id,
    /// The joint where it ends.
    #[cfg_attr(feature = "schema", schemars(with = "String"))]
    pub to: Id,
    /// Level, vertical or sloped.
    pub runs: Runs,
    /// Its developed length; not stated, worked out from positions or heights.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub length: Option<Measure>,
    /// How far its lower end is below its upper end, for vertical and sloped pipe.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub drop: Option<Measure>,
    /// Its slope, for level and sloped pipe; not stated, the least that the edition allows.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub slope: Option<Written<Slope>>,
    /// Its size, where it is fixed already: never less than this, and a finding if the code asks more.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub size: Option<PipeSize>,
    /// Its name in the code's terms, where the user wants to state it.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub name: Option<StatedName>,
    /// In or under the ground.
    #[serde(default, skip_serializing_if = "is_false")]
    pub underground: bool,
    /// Outside the building's wall.
    #[serde(default, skip_serializing_if = "is_false")]
    pub outside: bool,
    /// The sum of its turns in degrees.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub turns: Option<u16>,
}

/// A pipe that carries air, drawn toward the open air.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[cfg_attr(feature = "schema", derive(schemars::JsonSchema))]
#[serde(deny_unknown_fields)]
pub struct Vent {
    /// Its id, such as `v1`.
    #[cfg_attr(feature = "schema", schemars(with = "String"))]
    pub id: Id,
    /// The joint where it leaves a drain or other vents.
    #[cfg_attr(feature = "schema", schemars(with = "String"))]
    pub from: Id,
    /// The joint, terminal or valve where it ends.
    #[cfg_attr(feature = "schema", schemars(with = "String"))]
    pub to: Id,
    /// Its developed length; not stated, worked out from positions and heights.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub length: Option<Measure>,
    /// Its size, where it is fixed already.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub size: Option<PipeSize>,
    /// Its name in the code's terms, where the user wants to state it.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub name: Option<StatedName>,
}

/// What a vent passes before it ends in open air.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash, Serialize, Deserialize)]
#[cfg_attr(feature = "schema", derive(schemars::JsonSchema))]
#[serde(rename_all = "kebab-case")]
pub enum Through {
    /// The roof.
    Roof,
    /// An outside wall.
    Wall,
}

/// Where a vent ends in open air.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[cfg_attr(feature = "schema", derive(schemars::JsonSchema))]
#[serde(deny_unknown_fields)]
pub struct Terminal {
    /// Its id, such as `T1`.
    #[cfg_attr(feature = "schema", schemars(with = "String"))]
    pub id: Id,
    /// Roof or wall.
    pub through: Through,
    /// The level that its place is measured from.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    #[cfg_attr(feature = "schema", schemars(with = "Option<String>"))]
    pub level: Option<Id>,
    /// Where it is on the plan.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub at: Option<Position>,
    /// Its height above the floor of `level`.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub height: Option<Measure>,
    /// How far it ends above the roof, or, through a wall, above the ground.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub above: Option<Measure>,
}

/// Why an air admittance valve is permitted where it stands.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash, Serialize, Deserialize)]
#[cfg_attr(feature = "schema", derive(schemars::JsonSchema))]
#[serde(rename_all = "kebab-case")]
pub enum Grounds {
    /// A fixture in an island counter.
    Island,
    /// Frost may close the vent.
    Frost,
    /// A dwelling of one or two families is renovated.
    Renovation,
    /// Connection to a vent is not practical; the authority decides.
    NotPractical,
}

/// An air admittance valve.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[cfg_attr(feature = "schema", derive(schemars::JsonSchema))]
#[serde(deny_unknown_fields)]
pub struct Valve {
    /// Its id, such as `A1`.
    #[cfg_attr(feature = "schema", schemars(with = "String"))]
    pub id: Id,
    /// Why it is permitted.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub grounds: Option<Grounds>,
    /// The level that its place is measured from.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    #[cfg_attr(feature = "schema", schemars(with = "Option<String>"))]
    pub level: Option<Id>,
    /// Where it is on the plan.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub at: Option<Position>,
    /// Its height above the floor of `level`.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub height: Option<Measure>,
}

/// A cleanout at a joint.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[cfg_attr(feature = "schema", derive(schemars::JsonSchema))]
#[serde(deny_unknown_fields)]
pub struct Cleanout {
    /// Its id, such as `C1`.
    #[cfg_attr(feature = "schema", schemars(with = "String"))]
    pub id: Id,
    /// The joint where it gives access.
    #[cfg_attr(feature = "schema", schemars(with = "String"))]
    pub at: Id,
}

/// The connection to the public sewer or the disposal system.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[cfg_attr(feature = "schema", derive(schemars::JsonSchema))]
#[serde(deny_unknown_fields)]
pub struct Sewer {
    /// The joint where the building's piping ends.
    #[cfg_attr(feature = "schema", schemars(with = "String"))]
    pub at: Id,
    /// The invert of the connection, above the datum of the levels; not stated, inverts cannot be given.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub invert: Option<Measure>,
}
