//! How sure a value is.

use serde::{Deserialize, Serialize};

/// How a value is attested, the best first.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash, Serialize, Deserialize)]
#[cfg_attr(feature = "schema", derive(schemars::JsonSchema))]
#[serde(rename_all = "kebab-case")]
pub enum Witness {
    /// Two or more independent printed sources.
    PrintedTwo,
    /// One printed source of the code.
    PrintedOne,
    /// A provincial text that descends from the code.
    PrintedProvincial,
    /// Practice of the trade agrees; no printed code was seen.
    CommonPractice,
    /// A reading or parameter of this engine.
    Engine,
    /// Sources disagree; the safe value stands.
    Disputed,
    /// From memory; nobody here has seen it in print.
    Memory,
    /// From memory, and unsure.
    Unsure,
}

impl Witness {
    /// Whether somebody has seen the value in print, or it is practice or a parameter of the engine.
    #[must_use]
    pub fn is_attested(self) -> bool {
        !matches!(self, Self::Disputed | Self::Memory | Self::Unsure)
    }

    /// In words, for schedules.
    #[must_use]
    pub fn words(self) -> &'static str {
        match self {
            Self::PrintedTwo => "seen in print, two sources",
            Self::PrintedOne => "seen in print, one source",
            Self::PrintedProvincial => "seen in print in a provincial text",
            Self::CommonPractice => "common practice",
            Self::Engine => "parameter of this engine",
            Self::Disputed => "sources disagree, safe value taken",
            Self::Memory => "from memory, not seen in print",
            Self::Unsure => "from memory and unsure",
        }
    }

    /// The stable name.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::PrintedTwo => "printed-two",
            Self::PrintedOne => "printed-one",
            Self::PrintedProvincial => "printed-provincial",
            Self::CommonPractice => "common-practice",
            Self::Engine => "engine",
            Self::Disputed => "disputed",
            Self::Memory => "memory",
            Self::Unsure => "unsure",
        }
    }
}
