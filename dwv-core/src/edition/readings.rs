//! Where a clause has several lawful readings, the one in force is a named choice of the edition.

use serde::{Deserialize, Serialize};

use super::Cited;

/// Where the building drain ends upstream.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash, Serialize, Deserialize)]
#[serde(rename_all = "kebab-case")]
pub enum BuildingDrainEnd {
    /// At the foot of the most remote stack that takes a water closet.
    MostRemoteSoilStack,
    /// At the foot of the most remote stack of any kind.
    MostRemoteStack,
}

/// How the least size of a building sewer bears on the building drain.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash, Serialize, Deserialize)]
#[serde(rename_all = "kebab-case")]
pub enum UndergroundDrain {
    /// A building drain underground is no smaller than a building sewer.
    AsBuildingSewer,
    /// Only the load counts.
    ByLoad,
}

/// How vents by load and length are sized while their table is known from memory only.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash, Serialize, Deserialize)]
#[serde(rename_all = "kebab-case")]
pub enum VentLengthReading {
    /// The larger of the recalled table and of the stack vent table for a stack of that load.
    LargerOfRecalledAndStandIn,
    /// The recalled table.
    Recalled,
}

/// The readings in force.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct Readings {
    /// Where the building drain ends upstream.
    pub building_drain_end: Cited<BuildingDrainEnd>,
    /// The least size of a building drain underground.
    pub building_drain_underground: Cited<UndergroundDrain>,
    /// Vents by load and length.
    pub vent_length: Cited<VentLengthReading>,
}
