//! What the user draws: fixtures, joints, drains, vents and where they end.
//!
//! A [`Layout`] is plain data, the same as a file of the format `dwv-layout/1`. Lengths are kept as they were typed
//! (`3'-6 1/2"` stays so). Whether the drawing makes a drainage system is asked when a [`crate::network::Network`] is made of it.

mod builder;
mod diagnose;
mod element;
mod file;
pub mod limits;
#[cfg(feature = "schema")]
mod schema;

pub use builder::{Element, LayoutBuilder, Piece, Stated};
pub use element::{
    Cleanout, Drain, Fixture, Format, Grounds, Joint, Level, Position, Runs, Sewer, StatedName, Terminal, Through,
    Valve, Vent,
};

#[cfg(feature = "schema")]
pub use schema::layout_schema;

use compact_str::CompactString;
use serde::{Deserialize, Serialize};

use crate::quantity::{LengthUnit, PipeSize};

/// The id of an element: short text, unique in its layout.
pub type Id = CompactString;

/// A drawn drainage and vent system.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[cfg_attr(feature = "schema", derive(schemars::JsonSchema))]
#[serde(deny_unknown_fields)]
pub struct Layout {
    /// Where editors find the JSON Schema of the format; the engine does not look at it.
    #[serde(rename = "$schema", default, skip_serializing_if = "Option::is_none")]
    pub schema: Option<String>,
    /// Always `dwv-layout/1`.
    pub format: Format,
    /// What the drawing is called in schedules.
    #[cfg_attr(feature = "schema", schemars(with = "String"))]
    pub name: CompactString,
    /// The code edition to size by, such as `npc-2015`.
    #[cfg_attr(feature = "schema", schemars(with = "String"))]
    pub edition: CompactString,
    /// The unit of lengths that are written as bare numbers. Without it every length names its unit.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub units: Option<LengthUnit>,
    /// Whether frost can close a vent where it passes the roof. Not stated: taken as yes, and said so.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub frost_can_close_vents: Option<bool>,
    /// The pipe sizes at hand. Not stated: every size of the edition.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    pub pipe_sizes: Option<Vec<PipeSize>>,
    /// The joint where the building drain ends upstream, when the user marks it.
    #[serde(default, skip_serializing_if = "Option::is_none")]
    #[cfg_attr(feature = "schema", schemars(with = "Option<String>"))]
    pub building_drain_ends_at: Option<Id>,
    /// The floors, in any order.
    pub levels: Vec<Level>,
    /// The fixtures, each with its trap.
    pub fixtures: Vec<Fixture>,
    /// Where pipes meet.
    #[serde(default)]
    pub joints: Vec<Joint>,
    /// Pipes that carry waste, drawn in the direction of flow.
    pub drains: Vec<Drain>,
    /// Pipes that carry air, drawn toward the open air.
    #[serde(default)]
    pub vents: Vec<Vent>,
    /// Where vents end in open air.
    #[serde(default)]
    pub terminals: Vec<Terminal>,
    /// Air admittance valves.
    #[serde(default, skip_serializing_if = "Vec::is_empty")]
    pub valves: Vec<Valve>,
    /// Cleanouts.
    #[serde(default, skip_serializing_if = "Vec::is_empty")]
    pub cleanouts: Vec<Cleanout>,
    /// The connection to the public sewer or the disposal system.
    pub sewer: Sewer,
}
