//! The rows of a sizing in the shape that C reads.

use dwv_core::Sizing;
use dwv_core::quantity::{Elevation, FixtureUnits, Length, PipeSize};
use dwv_core::schedule::{ReasonRow, Status};

use super::{
    dwv_decision, dwv_finding_row, dwv_fixture_row, dwv_load, dwv_measure, dwv_pipe_row, dwv_pipe_size, dwv_reason_row,
    dwv_terminal_row, dwv_vent_row,
};
use crate::text::{Texts, dwv_text};

/// All rows with the texts that they point to.
#[derive(Debug, Default)]
pub(crate) struct Rows {
    pub(crate) pipes: Vec<dwv_pipe_row>,
    pub(crate) pipe_reasons: Vec<Vec<dwv_reason_row>>,
    pub(crate) vents: Vec<dwv_vent_row>,
    pub(crate) vent_reasons: Vec<Vec<dwv_reason_row>>,
    pub(crate) terminals: Vec<dwv_terminal_row>,
    pub(crate) fixtures: Vec<dwv_fixture_row>,
    pub(crate) findings: Vec<dwv_finding_row>,
    texts: Texts,
}

impl Rows {
    pub(crate) fn new(sizing: &Sizing) -> Self {
        let mut rows = Self::default();
        rows.add_pipes(sizing);
        rows.add_vents(sizing);
        rows.add_terminals(sizing);
        rows.add_fixtures(sizing);
        rows.add_findings(sizing);
        rows
    }

    fn size(&mut self, size: Option<PipeSize>) -> dwv_pipe_size {
        match size {
            Some(size) => dwv_pipe_size { hundredths: hundredths(size), text: self.texts.add(size.text()) },
            None => dwv_pipe_size { hundredths: 0, text: dwv_text::EMPTY },
        }
    }

    fn reasons(&mut self, reasons: &[ReasonRow]) -> Vec<dwv_reason_row> {
        let mut rows = Vec::with_capacity(reasons.len());
        for reason in reasons {
            rows.push(dwv_reason_row {
                rule: self.texts.add(reason.rule),
                says: self.texts.add(&reason.says),
                asks: self.size(Some(reason.asks)),
                clause: self.texts.add(&reason.clause),
                witness: self.texts.add(reason.witness.name()),
                governs: reason.governs,
            });
        }
        rows
    }

    fn add_pipes(&mut self, sizing: &Sizing) {
        for row in sizing.pipes() {
            let reasons = self.reasons(&row.reasons);
            let pipe = dwv_pipe_row {
                id: self.texts.add(&row.id),
                name: self.texts.add(row.name),
                from: self.texts.add(&row.from),
                to: self.texts.add(&row.to),
                load_thousandths: row.load.thousandths(),
                traps: row.traps,
                water_closets: row.water_closets,
                size: self.size(row.size),
                decision: decision(row.status),
                governed_by: self.texts.add(&row.governed_by),
                clause: self.texts.add(&row.clause),
                room: load(row.room),
                wet_vent: row.wet_vent,
                vertical: row.vertical,
                slope: self.texts.add(row.slope.as_deref().unwrap_or_default()),
                length: measure(row.length),
                fall: measure(row.fall),
                invert_up: elevation(row.invert_up),
                invert_down: elevation(row.invert_down),
                reasons: reasons.len(),
            };
            self.pipes.push(pipe);
            self.pipe_reasons.push(reasons);
        }
    }

    fn add_vents(&mut self, sizing: &Sizing) {
        for row in sizing.vents() {
            let reasons = self.reasons(&row.reasons);
            let vent = dwv_vent_row {
                id: self.texts.add(&row.id),
                name: self.texts.add(row.name),
                from: self.texts.add(&row.from),
                to: self.texts.add(&row.to),
                ends_at: self.texts.add(&row.ends_at),
                largest_trap: self.size(row.largest_trap),
                load_thousandths: row.load.thousandths(),
                developed_length: measure(row.developed_length),
                size: self.size(row.size),
                decision: decision(row.status),
                governed_by: self.texts.add(&row.governed_by),
                clause: self.texts.add(&row.clause),
                reasons: reasons.len(),
            };
            self.vents.push(vent);
            self.vent_reasons.push(reasons);
        }
    }

    fn add_terminals(&mut self, sizing: &Sizing) {
        for row in sizing.terminals() {
            let terminal = dwv_terminal_row {
                id: self.texts.add(&row.id),
                vent: self.texts.add(&row.vent),
                size: self.size(row.size),
                decision: decision(row.status),
                above: measure(row.above),
                governed_by: self.texts.add(&row.governed_by),
                clause: self.texts.add(&row.clause),
            };
            self.terminals.push(terminal);
        }
    }

    fn add_fixtures(&mut self, sizing: &Sizing) {
        for row in sizing.fixtures() {
            let fixture = dwv_fixture_row {
                id: self.texts.add(&row.id),
                kind: self.texts.add(&row.kind),
                level: self.texts.add(&row.level),
                trap: self.size(Some(row.trap)),
                outlet: self.size(row.outlet),
                outlet_length: measure(row.outlet_length),
                load_thousandths: row.load.thousandths(),
                load_clause: self.texts.add(&row.load_clause),
                load_witness: self.texts.add(row.load_witness.map_or("", |witness| witness.name())),
                trap_arm: measure(row.trap_arm_length),
                trap_arm_fall: measure(row.trap_arm_fall),
                protected_by: self.texts.add(row.protected_by.as_deref().unwrap_or_default()),
                air: self.texts.add(&row.air),
            };
            self.fixtures.push(fixture);
        }
    }

    fn add_findings(&mut self, sizing: &Sizing) {
        for row in sizing.findings() {
            let finding = dwv_finding_row {
                check: self.texts.add(row.check),
                severity: self.texts.add(row.severity.name()),
                element: self.texts.add(row.element.as_deref().unwrap_or_default()),
                message: self.texts.add(&row.message),
                remedy: self.texts.add(&row.remedy),
                clause: self.texts.add(&row.clause),
            };
            self.findings.push(finding);
        }
    }
}

/// A size in hundredths of an inch.
pub(crate) fn hundredths(size: PipeSize) -> u32 {
    const HUNDREDTH: i64 = 254_000;
    u32::try_from(size.nominal().nanometres() / HUNDREDTH).unwrap_or(0)
}

fn decision(status: Status) -> dwv_decision {
    match status {
        Status::Decided => dwv_decision::DWV_DECIDED,
        Status::Provisional => dwv_decision::DWV_PROVISIONAL,
        Status::CannotDecide => dwv_decision::DWV_CANNOT_DECIDE,
    }
}

fn measure(length: Option<Length>) -> dwv_measure {
    dwv_measure { known: length.is_some(), nanometres: length.map_or(0, Length::nanometres) }
}

fn elevation(elevation: Option<Elevation>) -> dwv_measure {
    measure(elevation.map(|elevation| elevation.0))
}

fn load(load: Option<FixtureUnits>) -> dwv_load {
    dwv_load { known: load.is_some(), thousandths: load.map_or(0, FixtureUnits::thousandths) }
}
