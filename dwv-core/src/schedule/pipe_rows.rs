//! Drains, vents and terminals as rows.

use serde::{Serialize, Serializer};

use super::{ReasonRow, Status};
use crate::Sizing;
use crate::explain::{drain_name, vent_name};
use crate::loading::VentLoads;
use crate::network::{DrainId, VentEnd, VentId};
use crate::quantity::{Elevation, FixtureUnits, Length, PipeSize, SlopeNotation};
use crate::sizing::Reasons;

/// A length in metres, exact to the nanometre.
pub(super) fn metres<S: Serializer>(length: &Option<Length>, serializer: S) -> Result<S::Ok, S::Error> {
    match length {
        Some(length) => serializer.serialize_f64(length.nanometres() as f64 / 1e9),
        None => serializer.serialize_none(),
    }
}

fn elevation<S: Serializer>(elevation: &Option<Elevation>, serializer: S) -> Result<S::Ok, S::Error> {
    metres(&elevation.map(|elevation| elevation.0), serializer)
}

/// A drain of the pipe schedule.
#[derive(Debug, Clone, PartialEq, Eq, Serialize)]
#[cfg_attr(feature = "schema", derive(schemars::JsonSchema))]
pub struct PipeRow {
    /// The id in the drawing.
    pub id: String,
    /// What it is called.
    pub name: &'static str,
    /// Where it begins.
    pub from: String,
    /// Where it ends.
    pub to: String,
    /// The load.
    pub load: FixtureUnits,
    /// The traps upstream.
    pub traps: u32,
    /// The water closets upstream.
    pub water_closets: u32,
    /// The size; none when it cannot be decided.
    pub size: Option<PipeSize>,
    /// How far the size is decided.
    pub status: Status,
    /// What governs the size, in words.
    pub governed_by: String,
    /// The clause that governs the size.
    pub clause: String,
    /// The load that it could still take before a table asks for more.
    pub room: Option<FixtureUnits>,
    /// Whether it serves as a wet vent.
    pub wet_vent: bool,
    /// Whether it runs vertically.
    pub vertical: bool,
    /// The slope as it was written, or as a ratio.
    pub slope: Option<String>,
    /// The developed length, in metres in JSON.
    #[serde(rename = "length_m", serialize_with = "metres")]
    #[cfg_attr(feature = "schema", schemars(with = "Option<f64>"))]
    pub length: Option<Length>,
    /// The fall, in metres in JSON.
    #[serde(rename = "fall_m", serialize_with = "metres")]
    #[cfg_attr(feature = "schema", schemars(with = "Option<f64>"))]
    pub fall: Option<Length>,
    /// The invert at the upper end, in metres in JSON.
    #[serde(rename = "invert_up_m", serialize_with = "elevation")]
    #[cfg_attr(feature = "schema", schemars(with = "Option<f64>"))]
    pub invert_up: Option<Elevation>,
    /// The invert at the lower end, in metres in JSON.
    #[serde(rename = "invert_down_m", serialize_with = "elevation")]
    #[cfg_attr(feature = "schema", schemars(with = "Option<f64>"))]
    pub invert_down: Option<Elevation>,
    /// Every minimum.
    pub reasons: Vec<ReasonRow>,
}

/// A vent of the vent schedule.
#[derive(Debug, Clone, PartialEq, Eq, Serialize)]
#[cfg_attr(feature = "schema", derive(schemars::JsonSchema))]
pub struct VentRow {
    /// The id in the drawing.
    pub id: String,
    /// What it is called.
    pub name: &'static str,
    /// Where it begins.
    pub from: String,
    /// Where it ends.
    pub to: String,
    /// The terminal or valve that its air comes from.
    pub ends_at: String,
    /// The largest trap that gets its air here.
    pub largest_trap: Option<PipeSize>,
    /// The load that it is sized by.
    pub load: FixtureUnits,
    /// The developed length that it is sized by; none where length does not count. In metres in JSON.
    #[serde(rename = "developed_length_m", serialize_with = "metres")]
    #[cfg_attr(feature = "schema", schemars(with = "Option<f64>"))]
    pub developed_length: Option<Length>,
    /// Its own length, in metres in JSON.
    #[serde(rename = "length_m", serialize_with = "metres")]
    #[cfg_attr(feature = "schema", schemars(with = "Option<f64>"))]
    pub length: Option<Length>,
    /// The size; none when it cannot be decided.
    pub size: Option<PipeSize>,
    /// How far the size is decided.
    pub status: Status,
    /// What governs the size, in words.
    pub governed_by: String,
    /// The clause that governs the size.
    pub clause: String,
    /// Every minimum.
    pub reasons: Vec<ReasonRow>,
}

/// Where a vent ends in open air.
#[derive(Debug, Clone, PartialEq, Eq, Serialize)]
#[cfg_attr(feature = "schema", derive(schemars::JsonSchema))]
pub struct TerminalRow {
    /// The id in the drawing.
    pub id: String,
    /// The vent that ends here.
    pub vent: String,
    /// `roof` or `wall`.
    pub through: crate::layout::Through,
    /// How far it ends above the roof or the ground, in metres in JSON.
    #[serde(rename = "above_m", serialize_with = "metres")]
    #[cfg_attr(feature = "schema", schemars(with = "Option<f64>"))]
    pub above: Option<Length>,
    /// The size where it passes to open air; none when it cannot be decided.
    pub size: Option<PipeSize>,
    /// How far the size is decided.
    pub status: Status,
    /// What governs the size, in words.
    pub governed_by: String,
    /// The clause that governs the size.
    pub clause: String,
    /// Every minimum.
    pub reasons: Vec<ReasonRow>,
}

impl Sizing {
    fn decided(&self, size: PipeSize, status: Status) -> Option<PipeSize> {
        let refused = self.unattested == crate::sizing_run::Unattested::Refuse && status == Status::CannotDecide;
        (!refused).then_some(size)
    }

    pub(crate) fn drain_status(&self, index: usize) -> Status {
        let beyond = self.columns.sizes.drain_beyond.binary_search(&DrainId::new(index)).is_ok();
        self.status(self.columns.sizes.drain_reasons.of(index), self.columns.sizes.drain_sure[index], beyond)
    }

    pub(crate) fn vent_status(&self, index: usize) -> Status {
        let loads = &self.columns.vent_loads;
        let missing = loads.length_missing[index] && VentLoads::length_counts(self.columns.names.vent[index].name);
        let beyond = self.columns.sizes.vent_beyond.binary_search(&VentId::new(index)).is_ok();
        self.status(self.columns.sizes.vent_reasons.of(index), self.columns.sizes.vent_sure[index], missing || beyond)
    }

    fn terminal_status(&self, index: usize) -> Status {
        let own =
            self.status(self.columns.sizes.terminal_reasons.of(index), self.columns.sizes.terminal_sure[index], false);
        let vent = self.vent_status(self.network.terminals[index].vent.index());
        match (own, vent) {
            (Status::CannotDecide, _) | (_, Status::CannotDecide) => Status::CannotDecide,
            (Status::Provisional, _) | (_, Status::Provisional) => Status::Provisional,
            _ => Status::Decided,
        }
    }

    /// The size of a drain, when it can be decided.
    pub(crate) fn drain_size(&self, index: usize) -> Option<PipeSize> {
        self.decided(self.columns.sizes.drain[index], self.drain_status(index))
    }

    /// The size of a vent, when it can be decided.
    pub(crate) fn vent_size(&self, index: usize) -> Option<PipeSize> {
        self.decided(self.columns.sizes.vent[index], self.vent_status(index))
    }

    /// The size at a terminal, when it can be decided.
    pub(crate) fn terminal_size(&self, index: usize) -> Option<PipeSize> {
        self.decided(self.columns.sizes.terminal[index], self.terminal_status(index))
    }

    /// What governs, in words, and its clause.
    fn governing(&self, reasons: &Reasons, index: usize) -> (String, String) {
        match reasons.governing(index) {
            Some(reason) => (crate::explain::says(&self.network, reason), self.clause(reason.citation)),
            None => ("smallest size at hand".to_owned(), String::new()),
        }
    }

    /// The drains, from the sewer upstream.
    #[must_use]
    pub fn pipes(&self) -> Vec<PipeRow> {
        (0..self.network.drains.len()).rev().map(|index| self.pipe_row(DrainId::new(index))).collect()
    }

    fn pipe_row(&self, drain: DrainId) -> PipeRow {
        let (drains, columns) = (&self.network.drains, &self.columns);
        let index = drain.index();
        let (governed_by, clause) = self.governing(&columns.sizes.drain_reasons, index);
        let notation = drains.slope_notation[index].unwrap_or(SlopeNotation::Ratio);
        PipeRow {
            id: drains.id[index].to_string(),
            name: drain_name(&columns.names, drain),
            from: drains.from[index].to_string(),
            to: drains.to[index].to_string(),
            load: columns.loads.load[index],
            traps: columns.loads.traps[index],
            water_closets: columns.loads.water_closets[index],
            size: self.drain_size(index),
            status: self.drain_status(index),
            governed_by,
            clause,
            room: columns.sizes.room[index],
            wet_vent: columns.names.wet[index],
            vertical: drains.vertical[index],
            slope: columns.grades.slope[index].map(|slope| slope.in_notation(notation).to_string()),
            length: drains.length[index],
            fall: columns.grades.fall[index],
            invert_up: columns.grades.invert_up[index],
            invert_down: columns.grades.invert_down[index],
            reasons: self.reason_rows(&columns.sizes.drain_reasons, index),
        }
    }

    /// The vents, from open air inward.
    #[must_use]
    pub fn vents(&self) -> Vec<VentRow> {
        (0..self.network.vents.len()).rev().map(|index| self.vent_row(index)).collect()
    }

    fn vent_row(&self, index: usize) -> VentRow {
        let (vents, columns) = (&self.network.vents, &self.columns);
        let (governed_by, clause) = self.governing(&columns.sizes.vent_reasons, index);
        let name = columns.names.vent[index].name;
        let ends_at = match vents.end[index] {
            VentEnd::Terminal(terminal) => &self.network.terminals[terminal as usize].id,
            VentEnd::Valve(valve) => &self.network.valves[valve as usize].id,
        };
        VentRow {
            id: vents.id[index].to_string(),
            name: vent_name(name),
            from: vents.from[index].to_string(),
            to: vents.to[index].to_string(),
            ends_at: ends_at.to_string(),
            largest_trap: columns.vent_loads.trap[index],
            load: columns.vent_loads.load[index],
            developed_length: VentLoads::length_counts(name).then_some(columns.vent_loads.length[index]),
            length: vents.length[index],
            size: self.vent_size(index),
            status: self.vent_status(index),
            governed_by,
            clause,
            reasons: self.reason_rows(&columns.sizes.vent_reasons, index),
        }
    }

    /// The terminals, by id.
    #[must_use]
    pub fn terminals(&self) -> Vec<TerminalRow> {
        let mut rows: Vec<TerminalRow> =
            (0..self.network.terminals.len()).map(|index| self.terminal_row(index)).collect();
        rows.sort_by(|left, right| left.id.cmp(&right.id));
        rows
    }

    fn terminal_row(&self, index: usize) -> TerminalRow {
        let terminal = &self.network.terminals[index];
        let (governed_by, clause) = self.governing(&self.columns.sizes.terminal_reasons, index);
        TerminalRow {
            id: terminal.id.to_string(),
            vent: self.network.vents.id[terminal.vent.index()].to_string(),
            through: terminal.through,
            above: terminal.above,
            size: self.terminal_size(index),
            status: self.terminal_status(index),
            governed_by,
            clause,
            reasons: self.reason_rows(&self.columns.sizes.terminal_reasons, index),
        }
    }
}
