//! The data as it stands in the file.

use std::collections::BTreeMap;

use serde::Deserialize;

use crate::edition::{BuildingDrainEnd, FixtureClass, Limit, UndergroundDrain, VentLengthReading, Witness};
use crate::quantity::{FixtureUnits, FlowRate, Length, PipeSize, Slope, Written};

#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
pub(super) struct RawEdition {
    pub(super) id: String,
    pub(super) title: String,
    pub(super) short: String,
    pub(super) pipe_sizes: Vec<PipeSize>,
    pub(super) open_questions: Vec<String>,
    pub(super) readings: RawReadings,
    pub(super) fixtures: RawTable<RawKind>,
    pub(super) bathroom_group: RawTable<RawGroup>,
    pub(super) unlisted: RawTable<RawTrapLoad>,
    pub(super) semi_continuous: RawTable<RawFlowLoad>,
    pub(super) stack: RawTable<RawStack>,
    pub(super) branch: RawTable<RawSizeLoad>,
    pub(super) building_drain: RawBuildingDrain,
    pub(super) trap_arm: RawTable<RawArm>,
    pub(super) vent_by_trap: RawTable<RawTrapVent>,
    pub(super) wet_vent: RawTable<RawWetVent>,
    pub(super) stack_vent: RawVentTable,
    pub(super) vent_length: RawVentTable,
    pub(super) rules: BTreeMap<String, RawRule>,
    pub(super) source: Vec<RawSource>,
}

#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
pub(super) struct RawSource {
    pub(super) key: String,
    pub(super) title: String,
    pub(super) url: String,
}

#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
pub(super) struct RawReadings {
    pub(super) building_drain_end: RawReading<BuildingDrainEnd>,
    pub(super) building_drain_underground: RawReading<UndergroundDrain>,
    pub(super) vent_length: RawReading<VentLengthReading>,
}

#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
pub(super) struct RawReading<T> {
    pub(super) reading: T,
    pub(super) clause: String,
    pub(super) witness: Witness,
    #[serde(default)]
    pub(super) sources: Vec<String>,
    pub(super) note: String,
}

#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
pub(super) struct RawTable<R> {
    pub(super) clause: String,
    #[serde(default)]
    pub(super) sources: Vec<String>,
    #[serde(default)]
    pub(super) note: Option<String>,
    pub(super) rows: Vec<R>,
}

#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
pub(super) struct RawKind {
    pub(super) key: String,
    pub(super) words: String,
    pub(super) class: FixtureClass,
    #[serde(default)]
    pub(super) siphonic: bool,
    #[serde(default)]
    pub(super) flush_valve: bool,
    pub(super) outlet: PipeSize,
    pub(super) outlet_witness: Witness,
    pub(super) trap: Option<PipeSize>,
    pub(super) load: Option<FixtureUnits>,
    pub(super) witness: Option<Witness>,
    #[serde(default)]
    pub(super) loads: Vec<RawTrapLoad>,
    pub(super) note: Option<String>,
}

#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
pub(super) struct RawGroup {
    pub(super) flush_valve: bool,
    pub(super) load: FixtureUnits,
    pub(super) witness: Witness,
}

#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
pub(super) struct RawTrapLoad {
    pub(super) trap: PipeSize,
    pub(super) load: FixtureUnits,
    pub(super) witness: Witness,
}

#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
pub(super) struct RawFlowLoad {
    pub(super) trap: PipeSize,
    pub(super) flow: Written<FlowRate>,
    pub(super) load: FixtureUnits,
    pub(super) witness: Witness,
}

#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
pub(super) struct RawStack {
    pub(super) size: PipeSize,
    pub(super) total: FixtureUnits,
    pub(super) one_storey: FixtureUnits,
    pub(super) witness: Witness,
    pub(super) one_storey_witness: Option<Witness>,
    pub(super) note: Option<String>,
}

#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
pub(super) struct RawSizeLoad {
    pub(super) size: PipeSize,
    pub(super) load: FixtureUnits,
    pub(super) witness: Witness,
}

#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
pub(super) struct RawBuildingDrain {
    pub(super) clause: String,
    pub(super) sources: Vec<String>,
    #[serde(default)]
    pub(super) note: Option<String>,
    pub(super) slopes: Vec<Written<Slope>>,
    pub(super) rows: Vec<RawBuildingDrainRow>,
}

#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
pub(super) struct RawBuildingDrainRow {
    pub(super) size: PipeSize,
    pub(super) loads: Vec<Cell>,
    pub(super) witness: Witness,
}

#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
pub(super) struct RawArm {
    pub(super) size: PipeSize,
    pub(super) longest: Written<Length>,
    pub(super) slope: Written<Slope>,
    pub(super) witness: Witness,
    pub(super) slope_witness: Option<Witness>,
}

#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
pub(super) struct RawTrapVent {
    pub(super) trap: PipeSize,
    pub(super) vent: PipeSize,
    pub(super) witness: Witness,
}

#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
pub(super) struct RawWetVent {
    pub(super) size: PipeSize,
    pub(super) without: Cell,
    pub(super) with: Cell,
    pub(super) witness: Witness,
}

#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
pub(super) struct RawVentTable {
    pub(super) clause: String,
    #[serde(default)]
    pub(super) sources: Vec<String>,
    #[serde(default)]
    pub(super) note: Option<String>,
    pub(super) vents: Vec<PipeSize>,
    pub(super) rows: Vec<RawLengthRow>,
}

#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
pub(super) struct RawLengthRow {
    pub(super) stack: Option<PipeSize>,
    pub(super) load: FixtureUnits,
    pub(super) longest: Vec<Cell>,
    pub(super) witness: Witness,
}

/// A cell: a number, or a word where there is none.
#[derive(Deserialize)]
#[serde(untagged)]
pub(super) enum Cell {
    Number(f64),
    Word(Word),
}

#[derive(Deserialize, Clone, Copy)]
pub(super) enum Word {
    #[serde(rename = "not-permitted")]
    Barred,
    #[serde(rename = "not-known")]
    Unknown,
    #[serde(rename = "not-limited")]
    Free,
}

impl Word {
    pub(super) fn limit<T>(self) -> Limit<T> {
        match self {
            Self::Barred => Limit::NotPermitted,
            Self::Unknown => Limit::NotKnown,
            Self::Free => Limit::NotLimited,
        }
    }
}

#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
pub(super) struct RawRule {
    pub(super) clause: String,
    pub(super) says: String,
    pub(super) witness: Witness,
    #[serde(default)]
    pub(super) sources: Vec<String>,
    pub(super) note: Option<String>,
    pub(super) value: Option<toml::Value>,
}
