//! The head of every report.

use std::collections::BTreeSet;

use serde::Serialize;

use super::CAUTION;
use crate::Sizing;
use crate::edition::{BuildingDrainEnd, UndergroundDrain, VentLengthReading};
use crate::quantity::FixtureUnits;
use crate::sizing::{Reason, Rule};

/// What was sized, by which edition and readings, and how sure it is.
#[derive(Debug, Clone, PartialEq, Eq, Serialize)]
#[cfg_attr(feature = "schema", derive(schemars::JsonSchema))]
pub struct Summary {
    /// What the drawing is called.
    pub name: String,
    /// The id of the edition.
    pub edition: String,
    /// The title of the edition.
    pub title: String,
    /// The readings in force, in words.
    pub readings: Vec<String>,
    /// How many fixtures, drains and vents there are.
    pub fixtures: usize,
    /// How many drains.
    pub drains: usize,
    /// How many vents.
    pub vents: usize,
    /// The load at the sewer.
    pub load: FixtureUnits,
    /// How many sizes rest on values that nobody here has seen in print, and which; none when all were.
    pub unattested: Option<String>,
    /// The caution that every report carries.
    pub caution: &'static str,
}

impl Sizing {
    /// The head of a report.
    #[must_use]
    pub fn summary(&self) -> Summary {
        let drains = &self.network.drains;
        let at_sewer = (0..drains.len()).filter(|index| drains.next[*index].is_none());
        Summary {
            name: self.network.name.clone(),
            edition: self.edition.id.clone(),
            title: self.edition.title.clone(),
            readings: self.readings(),
            fixtures: self.network.fixtures.len(),
            drains: drains.len(),
            vents: self.network.vents.len(),
            load: at_sewer.map(|index| self.columns.loads.load[index]).sum(),
            unattested: self.unattested_line(),
            caution: CAUTION,
        }
    }

    fn readings(&self) -> Vec<String> {
        let readings = &self.edition.readings;
        let end = match readings.building_drain_end.value {
            BuildingDrainEnd::MostRemoteSoilStack => {
                "the building drain ends at the foot of the most remote soil stack"
            }
            BuildingDrainEnd::MostRemoteStack => {
                "the building drain ends at the foot of the most remote stack of any kind"
            }
        };
        let underground = match readings.building_drain_underground.value {
            UndergroundDrain::AsBuildingSewer => "a building drain underground is no smaller than a building sewer",
            UndergroundDrain::ByLoad => "a building drain underground is sized by load",
        };
        let vents = match readings.vent_length.value {
            VentLengthReading::LargerOfRecalledAndStandIn => {
                "vents by load and length take the larger of the recalled table and the stack vent table"
            }
            VentLengthReading::Recalled => "vents by load and length take the recalled table",
        };
        [
            (end, readings.building_drain_end.citation),
            (underground, readings.building_drain_underground.citation),
            (vents, readings.vent_length.citation),
        ]
        .map(|(words, citation)| format!("{words} ({})", self.clause(citation)))
        .to_vec()
    }

    /// `3 sizes rest on values that nobody here has seen in print: d1, v2, T1 (Table 2.5.8.4.)`
    fn unattested_line(&self) -> Option<String> {
        let sizes = &self.columns.sizes;
        let network = &self.network;
        let drains = (0..network.drains.len()).rev().map(|index| {
            (&network.drains.id[index], sizes.drain_sure[index], sizes.drain[index], sizes.drain_reasons.of(index))
        });
        let vents = (0..network.vents.len()).rev().map(|index| {
            (&network.vents.id[index], sizes.vent_sure[index], sizes.vent[index], sizes.vent_reasons.of(index))
        });
        let mut terminals: Vec<usize> = (0..network.terminals.len()).collect();
        terminals.sort_by_key(|index| &network.terminals[*index].id);
        let ends = terminals.into_iter().map(|index| {
            let reasons = sizes.terminal_reasons.of(index);
            (&network.terminals[index].id, sizes.terminal_sure[index], sizes.terminal[index], reasons)
        });
        let mut ids: Vec<&str> = Vec::new();
        let mut clauses: BTreeSet<String> = BTreeSet::new();
        for (id, sure, size, reasons) in drains.chain(vents).chain(ends) {
            let attested = |reason: &Reason| self.edition.witness(reason.citation).is_attested();
            let uncertain = reasons.iter().any(|reason| reason.rule == Rule::VentLength && !attested(reason));
            if sure && !uncertain {
                continue;
            }
            ids.push(id);
            let bearing =
                |reason: &&Reason| !attested(reason) && (reason.asks == size || reason.rule == Rule::VentLength);
            clauses.extend(reasons.iter().filter(bearing).map(|reason| self.clause(reason.citation)));
        }
        if ids.is_empty() {
            return None;
        }
        let sizes = if ids.len() == 1 { "1 size rests".to_owned() } else { format!("{} sizes rest", ids.len()) };
        let clauses: Vec<String> = clauses.into_iter().collect();
        Some(format!(
            "{sizes} on values that nobody here has seen in print: {} ({})",
            ids.join(", "),
            clauses.join("; ")
        ))
    }
}
