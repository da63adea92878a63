//! Fixtures as rows: what each loads, and how its trap gets its air.

use serde::Serialize;

use super::pipe_rows::metres;
use crate::Sizing;
use crate::checking::{Arm, is_exempt_from_vent};
use crate::edition::Witness;
use crate::network::{FixtureId, LoadSource, VentEnd};
use crate::quantity::{FixtureUnits, Length, PipeSize};

/// A fixture of the fixture-unit schedule.
#[derive(Debug, Clone, PartialEq, Eq, Serialize)]
#[cfg_attr(feature = "schema", derive(schemars::JsonSchema))]
pub struct FixtureRow {
    /// The id in the drawing.
    pub id: String,
    /// Its kind in words.
    pub kind: String,
    /// Its level.
    pub level: String,
    /// Its trap.
    pub trap: PipeSize,
    /// The least size of its outlet pipe, when the edition lists it.
    pub outlet: Option<PipeSize>,
    /// The length of its outlet pipe, when stated. In metres in JSON.
    #[serde(rename = "outlet_m", serialize_with = "metres")]
    #[cfg_attr(feature = "schema", schemars(with = "Option<f64>"))]
    pub outlet_length: Option<Length>,
    /// Its load.
    pub load: FixtureUnits,
    /// Where the load comes from.
    pub load_clause: String,
    /// How sure the load is; none when the drawing states it.
    pub load_witness: Option<Witness>,
    /// Only provided for.
    pub future: bool,
    /// The developed length of the trap arm; none when no air reaches it or a length is missing. In metres in JSON.
    #[serde(rename = "trap_arm_m", serialize_with = "metres")]
    #[cfg_attr(feature = "schema", schemars(with = "Option<f64>"))]
    pub trap_arm_length: Option<Length>,
    /// How far the trap arm falls, in metres in JSON.
    #[serde(rename = "trap_arm_fall_m", serialize_with = "metres")]
    #[cfg_attr(feature = "schema", schemars(with = "Option<f64>"))]
    pub trap_arm_fall: Option<Length>,
    /// The vent that protects it; none when it has none.
    pub protected_by: Option<String>,
    /// How it gets its air, in words.
    pub air: String,
    /// The way of its air: drains that serve as wet vents, vents, and the terminal or valve.
    pub air_path: Vec<String>,
}

impl Sizing {
    /// The fixtures, in the order of their drains from the sewer upstream.
    #[must_use]
    pub fn fixtures(&self) -> Vec<FixtureRow> {
        (0..self.network.fixtures.len()).rev().map(|index| self.fixture_row(FixtureId::new(index))).collect()
    }

    pub(crate) fn fixture_row(&self, fixture: FixtureId) -> FixtureRow {
        let network = &self.network;
        let fixtures = &network.fixtures;
        let index = fixture.index();
        let arm = self.case(|case| Arm::of(&case.operands, case.grades, fixture));
        let load = fixtures.load[index];
        let load_clause = match fixtures.load_source[index] {
            LoadSource::Stated => "as stated in the drawing".to_owned(),
            _ => self.clause(load.citation),
        };
        let stated = fixtures.load_source[index] == LoadSource::Stated;
        let load_witness = (!stated).then(|| self.edition.witness(load.citation));
        let kind = fixtures.kind[index];
        FixtureRow {
            id: fixtures.id[index].to_string(),
            kind: kind
                .map_or_else(|| "custom fixture".to_owned(), |kind| self.edition.fixtures.row(kind).words.clone()),
            level: network
                .levels
                .get(usize::from(fixtures.storey[index].0))
                .map_or_else(String::new, |level| level.id.to_string()),
            trap: fixtures.trap[index].value,
            outlet: fixtures.outlet[index].map(|outlet| outlet.value),
            outlet_length: fixtures.outlet_length[index],
            load: load.value,
            load_clause,
            load_witness,
            future: fixtures.future[index],
            trap_arm_length: arm.filter(|arm| !arm.length_missing).map(|arm| arm.length),
            trap_arm_fall: arm.filter(|arm| !arm.length_missing).map(|arm| arm.fall),
            protected_by: self.columns.names.trap[index].vent.map(|vent| network.vents.id[vent.index()].to_string()),
            air: self.air_words(fixture),
            air_path: self.air_path(fixture),
        }
    }

    fn air_words(&self, fixture: FixtureId) -> String {
        let trap = self.columns.names.trap[fixture.index()];
        let network = &self.network;
        match (trap.vent, trap.wet) {
            (Some(vent), None) => format!("vented by `{}`", network.vents.id[vent.index()]),
            (Some(vent), Some(wet)) => {
                format!(
                    "wet vented by `{}`, up to `{}`",
                    network.drains.id[wet.index()],
                    network.vents.id[vent.index()]
                )
            }
            (None, _) if self.case(|case| is_exempt_from_vent(case, fixture)) => {
                format!(
                    "floor drain, needs no vent ({})",
                    self.clause(self.edition.rules.floor_drain_unvented.citation)
                )
            }
            (None, _) => "no vent".to_owned(),
        }
    }

    fn air_path(&self, fixture: FixtureId) -> Vec<String> {
        let network = &self.network;
        let (wet, dry) = self.columns.names.air_path(network, fixture);
        let mut path: Vec<String> = wet.iter().map(|drain| network.drains.id[drain.index()].to_string()).collect();
        path.extend(dry.iter().map(|vent| network.vents.id[vent.index()].to_string()));
        if let Some(last) = dry.last() {
            path.push(match network.vents.end[last.index()] {
                VentEnd::Terminal(terminal) => network.terminals[terminal as usize].id.to_string(),
                VentEnd::Valve(valve) => network.valves[valve as usize].id.to_string(),
            });
        }
        path
    }
}
