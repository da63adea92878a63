//! The schedules that a plumber reads.

use super::{Status, Table};
use crate::Sizing;
use crate::edition::Witness;
use crate::error::{Error, ErrorKind, Fault, FaultCode, nearest};
use crate::quantity::{Length, LengthUnit, PipeSize};

const LEFT: bool = false;
const RIGHT: bool = true;

/// The names of the schedules.
pub const SCHEDULES: [&str; 5] = ["pipes", "vents", "fixtures", "inverts", "findings"];

impl Sizing {
    /// A schedule by its name, one of [`SCHEDULES`].
    ///
    /// # Errors
    /// Any other name; the nearest is told.
    pub fn schedule(&self, name: &str) -> Result<Table, Error> {
        match name {
            "pipes" => Ok(self.pipe_schedule()),
            "vents" => Ok(self.vent_schedule()),
            "fixtures" => Ok(self.fixture_schedule()),
            "inverts" => Ok(self.invert_schedule()),
            "findings" => Ok(self.finding_schedule()),
            _ => {
                let fault = Fault::new(FaultCode::UnknownWord, "", format!("no schedule has the name `{name}`"));
                Err(Error::one(
                    ErrorKind::Question,
                    match nearest(name, SCHEDULES) {
                        Some(near) => fault.help(format!("did you mean `{near}`?")),
                        None => fault.help(format!("the schedules are {}", SCHEDULES.join(", "))),
                    },
                ))
            }
        }
    }

    /// Every drain with its name, load, size, what governs it and its room.
    #[must_use]
    pub fn pipe_schedule(&self) -> Table {
        let mut table = Table::new(
            "PIPE SCHEDULE (from the sewer upstream)",
            &[
                ("pipe", LEFT),
                ("name", LEFT),
                ("from", LEFT),
                ("to", LEFT),
                ("FU", RIGHT),
                ("size in", RIGHT),
                ("slope", RIGHT),
                (self.head("length").as_str(), RIGHT),
                ("governed by", LEFT),
                ("clause", LEFT),
                ("room FU", RIGHT),
                ("note", LEFT),
            ],
        );
        for row in self.pipes() {
            let note = [
                (row.wet_vent, "wet vent"),
                (row.status == Status::Provisional, "provisional"),
                (row.status == Status::CannotDecide, "cannot decide"),
            ];
            let note: Vec<&str> = note.iter().filter(|(holds, _)| *holds).map(|(_, word)| *word).collect();
            table.rows.push(vec![
                row.id,
                row.name.to_owned(),
                row.from,
                row.to,
                row.load.to_string(),
                size(row.size),
                row.slope.unwrap_or_else(|| "vertical".to_owned()),
                self.number(row.length),
                row.governed_by,
                row.clause,
                row.room.map_or_else(|| "-".to_owned(), |room| room.to_string()),
                note.join(", "),
            ]);
        }
        table
    }

    /// Every vent and terminal with its name, what it serves, its developed length, its size and what governs it.
    #[must_use]
    pub fn vent_schedule(&self) -> Table {
        let mut table = Table::new(
            "VENT SCHEDULE (from open air inward)",
            &[
                ("vent", LEFT),
                ("name", LEFT),
                ("from", LEFT),
                ("to", LEFT),
                ("air from", LEFT),
                ("trap in", RIGHT),
                ("FU", RIGHT),
                (self.head("developed").as_str(), RIGHT),
                ("size in", RIGHT),
                ("governed by", LEFT),
                ("clause", LEFT),
                ("note", LEFT),
            ],
        );
        for row in self.terminals() {
            let (through, verb) = match row.through {
                crate::layout::Through::Roof => ("roof", "through the roof"),
                crate::layout::Through::Wall => ("wall", "through the wall"),
            };
            table.rows.push(vec![
                row.id,
                format!("terminal, {verb}"),
                row.vent,
                through.to_owned(),
                "open air".to_owned(),
                "-".to_owned(),
                "-".to_owned(),
                "-".to_owned(),
                size(row.size),
                row.governed_by,
                row.clause,
                note(row.status),
            ]);
        }
        for row in self.vents() {
            table.rows.push(vec![
                row.id,
                row.name.to_owned(),
                row.from,
                row.to,
                row.ends_at,
                row.largest_trap.map_or_else(|| "-".to_owned(), |trap| trap.to_string()),
                row.load.to_string(),
                self.number(row.developed_length),
                size(row.size),
                row.governed_by,
                row.clause,
                note(row.status),
            ]);
        }
        table
    }

    /// Every fixture with its load, its trap and how it gets its air.
    #[must_use]
    pub fn fixture_schedule(&self) -> Table {
        let mut table = Table::new(
            "FIXTURE UNIT SCHEDULE",
            &[
                ("fixture", LEFT),
                ("kind", LEFT),
                ("level", LEFT),
                ("outlet in", RIGHT),
                ("trap in", RIGHT),
                ("FU", RIGHT),
                ("load from", LEFT),
                (self.head("trap arm").as_str(), RIGHT),
                (self.head("falls").as_str(), RIGHT),
                ("air", LEFT),
                ("way of the air", LEFT),
            ],
        );
        for row in self.fixtures() {
            table.rows.push(vec![
                row.id,
                row.kind,
                row.level,
                row.outlet.map_or_else(|| "-".to_owned(), |outlet| outlet.to_string()),
                row.trap.to_string(),
                row.load.to_string(),
                with_witness(row.load_clause, row.load_witness),
                self.number(row.trap_arm_length),
                self.number(row.trap_arm_fall),
                row.air,
                row.air_path.join(" > "),
            ]);
        }
        table
    }

    /// Every drain with its fall and the inverts at its ends.
    #[must_use]
    pub fn invert_schedule(&self) -> Table {
        let mut table = Table::new(
            "INVERT SCHEDULE (from the sewer upstream)",
            &[
                ("pipe", LEFT),
                ("size in", RIGHT),
                ("slope", RIGHT),
                (self.head("length").as_str(), RIGHT),
                (self.head("fall").as_str(), RIGHT),
                ("lower end", LEFT),
                (self.head("invert").as_str(), RIGHT),
                ("upper end", LEFT),
                (self.head("invert").as_str(), RIGHT),
            ],
        );
        for row in self.pipes() {
            table.rows.push(vec![
                row.id,
                size(row.size),
                row.slope.unwrap_or_else(|| "vertical".to_owned()),
                self.number(row.length),
                self.number(row.fall),
                row.to,
                self.number(row.invert_down.map(|invert| invert.0)),
                row.from,
                self.number(row.invert_up.map(|invert| invert.0)),
            ]);
        }
        table
    }

    /// Everything found, the gravest kinds as they come.
    #[must_use]
    pub fn finding_schedule(&self) -> Table {
        let columns = [("what", LEFT), ("check", LEFT), ("found", LEFT), ("remedy", LEFT), ("clause", LEFT)];
        let mut table = Table::new("FINDINGS", &columns);
        for row in self.findings() {
            table.rows.push(vec![
                row.severity.name().to_owned(),
                row.check.to_owned(),
                row.message,
                row.remedy,
                row.clause,
            ]);
        }
        table
    }

    /// The whole report as aligned text: head, the four schedules, findings, caution.
    #[must_use]
    pub fn to_text(&self) -> String {
        let summary = self.summary();
        let mut text = format!(
            "{}\nsized by {}; {} fixtures, {} drains, {} vents; {} FU at the sewer\n",
            summary.name, summary.title, summary.fixtures, summary.drains, summary.vents, summary.load
        );
        for reading in &summary.readings {
            text.push_str(&format!("reading: {reading}\n"));
        }
        if let Some(unattested) = &summary.unattested {
            text.push_str(&format!("{unattested}\n"));
        }
        let tables = [
            self.pipe_schedule(),
            self.vent_schedule(),
            self.fixture_schedule(),
            self.invert_schedule(),
            self.finding_schedule(),
        ];
        for table in tables {
            text.push('\n');
            if table.rows.is_empty() {
                text.push_str(&format!("{}\nnone\n", table.title));
            } else {
                text.push_str(&table.to_text());
            }
        }
        text.push_str(&format!("\n{}\n", summary.caution));
        text
    }

    /// A head with the unit of the column.
    fn head(&self, word: &str) -> String {
        match self.network.length_unit {
            LengthUnit::FootInch => format!("{word} ft-in"),
            unit => format!("{word} {}", unit.symbol()),
        }
    }

    /// A length under a head with its unit.
    fn number(&self, length: Option<Length>) -> String {
        let unit = self.network.length_unit;
        length.map_or_else(
            || "-".to_owned(),
            |length| {
                let text = length.rounded(unit).to_string();
                text.strip_suffix(unit.symbol()).map_or_else(|| text.clone(), |text| text.trim_end().to_owned())
            },
        )
    }
}

fn size(size: Option<PipeSize>) -> String {
    size.map_or_else(|| "cannot decide".to_owned(), |size| size.to_string())
}

/// A clause, with a word on how sure its value is when nobody here has seen it in print.
fn with_witness(clause: String, witness: Option<Witness>) -> String {
    match witness.filter(|witness| !witness.is_attested()) {
        Some(witness) => format!("{clause} [{}]", witness.words()),
        None => clause,
    }
}

fn note(status: Status) -> String {
    match status {
        Status::Decided => String::new(),
        Status::Provisional => "provisional".to_owned(),
        Status::CannotDecide => "cannot decide".to_owned(),
    }
}
