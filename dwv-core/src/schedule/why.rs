//! The full explanation of one pipe, fixture or terminal.

use std::fmt::Write;

use super::{CAUTION, Status};
use crate::error::{Error, ErrorKind, Fault, FaultCode, nearest};
use crate::explain::{drain_name, name_reason, says, vent_name};
use crate::loading::VentLoads;
use crate::naming::VentName;
use crate::network::{DrainId, FixtureId, VentEnd, VentId};
use crate::quantity::SlopeNotation;
use crate::sizing::{Reason, Reasons};
use crate::{Sizing, edition::CitationId};

impl Sizing {
    /// Why an element is what it is: its name, its load, every minimum with its clause, the governing one marked, its grade; for a
    /// fixture, how its trap gets its air.
    ///
    /// # Errors
    /// An id that is no pipe, fixture or terminal of the drawing; the nearest is named.
    pub fn why(&self, id: &str) -> Result<String, Error> {
        let network = &self.network;
        let find = |ids: &[crate::layout::Id]| ids.iter().position(|known| known == id);
        let mut text = if let Some(drain) = find(&network.drains.id) {
            self.why_drain(DrainId::new(drain))
        } else if let Some(vent) = find(&network.vents.id) {
            self.why_vent(VentId::new(vent))
        } else if let Some(fixture) = find(&network.fixtures.id) {
            self.why_fixture(FixtureId::new(fixture))
        } else if let Some(terminal) = network.terminals.iter().position(|terminal| terminal.id == id) {
            self.why_terminal(terminal)
        } else {
            return Err(self.unknown(id));
        };
        for row in self.findings().iter().filter(|row| row.element.as_deref() == Some(id)) {
            line(&mut text, &format!("{}: {} ({}); {}", row.severity.name(), row.message, row.clause, row.remedy));
        }
        line(&mut text, CAUTION);
        Ok(text)
    }

    fn unknown(&self, id: &str) -> Error {
        let network = &self.network;
        let ids = network.drains.id.iter().chain(&network.vents.id).chain(&network.fixtures.id);
        let ids = ids.chain(network.terminals.iter().map(|terminal| &terminal.id)).map(|id| id.as_str());
        let message = format!("no pipe, fixture or terminal has the id `{id}`");
        let fault = Fault::new(FaultCode::UnknownId, "", message);
        Error::one(
            ErrorKind::Question,
            match nearest(id, ids) {
                Some(near) => fault.help(format!("did you mean `{near}`?")),
                None => fault,
            },
        )
    }

    /// A clause with its edition.
    #[must_use]
    pub fn clause(&self, citation: CitationId) -> String {
        format!("{} {}", self.edition.short, self.edition.citation(citation).clause)
    }

    fn why_drain(&self, drain: DrainId) -> String {
        let (network, columns) = (&self.network, &self.columns);
        let index = drain.index();
        let drains = &network.drains;
        let unit = network.length_unit;
        let mut text = format!(
            "`{}`, {} from `{}` to `{}`: {}\n",
            drains.id[index],
            drain_name(&columns.names, drain),
            drains.from[index],
            drains.to[index],
            self.size_words(self.drain_size(index))
        );
        line(&mut text, &format!("name: {}", name_reason(network, &columns.names, drain)));
        let load = columns.loads.load[index];
        line(&mut text, &format!("load: {load} FU from {} upstream", traps(columns.loads.traps[index])));
        let relief = columns.loads.group_relief(drain);
        if relief.thousandths() > 0 {
            let citation = self.clause(self.edition.rules.bathroom_group.citation);
            line(&mut text, &format!("      {relief} FU less, because a whole bathroom group meets here ({citation})"));
        }
        if columns.names.wet[index] {
            line(&mut text, "serves as a wet vent");
        }
        self.write_reasons(&mut text, &columns.sizes.drain_reasons, index);
        self.write_status(&mut text, self.drain_status(index));
        match columns.sizes.room[index] {
            Some(room) => line(&mut text, &format!("room: {room} FU more before a table asks for a larger size")),
            None => line(&mut text, "room: no load table bears on it"),
        }
        if let Some(slope) = columns.grades.slope[index] {
            let notation = drains.slope_notation[index].unwrap_or(SlopeNotation::Ratio);
            let stated = if drains.slope[index].is_some() { "as drawn" } else { "the least for its size" };
            let least = self.edition.least_slope(columns.sizes.drain[index]);
            let clause = self.clause(least.citation);
            line(&mut text, &format!("slope: {}, {stated} ({clause})", slope.in_notation(notation)));
        }
        if let (Some(fall), Some(length)) = (columns.grades.fall[index], drains.length[index]) {
            line(&mut text, &format!("fall: {} over {}", fall.rounded(unit), length.rounded(unit)));
        }
        if let (Some(up), Some(down)) = (columns.grades.invert_up[index], columns.grades.invert_down[index]) {
            line(
                &mut text,
                &format!("inverts: {} at the upper end, {} at the lower", up.rounded(unit), down.rounded(unit)),
            );
        }
        text
    }

    fn why_vent(&self, vent: VentId) -> String {
        let (network, columns) = (&self.network, &self.columns);
        let index = vent.index();
        let vents = &network.vents;
        let role = columns.names.vent[index];
        let mut text = format!(
            "`{}`, {} from `{}` to `{}`: {}\n",
            vents.id[index],
            vent_name(role.name),
            vents.from[index],
            vents.to[index],
            self.size_words(self.vent_size(index))
        );
        line(&mut text, &format!("name: {}", vent_name_reason(role.name)));
        let end = match vents.end[index] {
            VentEnd::Terminal(terminal) => {
                let id = network.terminals.get(terminal as usize).map_or("?", |terminal| terminal.id.as_str());
                format!("ends in open air at `{id}`")
            }
            VentEnd::Valve(valve) => {
                let id = network.valves.get(valve as usize).map_or("?", |valve| valve.id.as_str());
                format!("ends at the air admittance valve `{id}`")
            }
        };
        line(&mut text, &end);
        let loads = &columns.vent_loads;
        let length = loads.length[index].rounded(network.length_unit);
        let missing = if loads.length_missing[index] { ", as far as lengths are known" } else { "" };
        if VentLoads::length_counts(role.name) {
            let way = loads.way(network, &columns.names, vent);
            let way: Vec<String> = way.iter().map(|vent| format!("`{}`", vents.id[vent.index()])).collect();
            line(&mut text, &format!("load: {} FU", loads.load[index]));
            line(&mut text, &format!("developed length: {length}{missing}, measured along {}", way.join(", ")));
        } else {
            let clause = self.clause(self.edition.rules.individual_dual_size.citation);
            line(&mut text, &format!("neither load nor length counts for it ({clause})"));
        }
        self.write_reasons(&mut text, &columns.sizes.vent_reasons, index);
        self.write_status(&mut text, self.vent_status(index));
        text
    }

    fn why_terminal(&self, terminal: usize) -> String {
        let row = &self.network.terminals[terminal];
        let size = self.size_words(self.terminal_size(terminal));
        let mut text = format!(
            "`{}`, where the vent `{}` ends in open air: {size}\n",
            row.id,
            self.network.vents.id[row.vent.index()]
        );
        self.write_reasons(&mut text, &self.columns.sizes.terminal_reasons, terminal);
        text
    }

    fn why_fixture(&self, fixture: FixtureId) -> String {
        let row = &self.fixture_row(fixture);
        let mut text = format!("`{}`, {} on `{}`\n", row.id, row.kind, row.level);
        let sure = row.load_witness.filter(|witness| !witness.is_attested());
        let sure = sure.map_or_else(String::new, |witness| format!(" [{}]", witness.words()));
        line(&mut text, &format!("load: {} FU ({}){sure}", row.load, row.load_clause));
        if let Some(outlet) = row.outlet {
            let length = row.outlet_length.map(|length| format!(", {} long", length.rounded(self.network.length_unit)));
            line(&mut text, &format!("fixture outlet pipe: at least {outlet} in{}", length.unwrap_or_default()));
        }
        line(&mut text, &format!("trap: {} in", row.trap));
        if let Some(length) = row.trap_arm_length {
            let unit = self.network.length_unit;
            let fall = row.trap_arm_fall.map(|fall| format!(", falls {}", fall.rounded(unit))).unwrap_or_default();
            line(&mut text, &format!("trap arm: {} long{fall}", length.rounded(unit)));
        }
        line(&mut text, &format!("air: {}", row.air));
        if !row.air_path.is_empty() {
            line(&mut text, &format!("way of the air: {}", row.air_path.join(", ")));
        }
        text
    }

    /// How far a size is decided, when it is not.
    fn write_status(&self, text: &mut String, status: Status) {
        match status {
            Status::Decided => {}
            Status::Provisional => line(text, "provisional: it rests on a value that nobody here has seen in print"),
            Status::CannotDecide => {
                line(text, "cannot be decided: a length is missing, a table ends, or a value was not seen in print")
            }
        }
    }

    fn size_words(&self, size: Option<crate::quantity::PipeSize>) -> String {
        size.map_or_else(|| "cannot decide".to_owned(), |size| format!("{size} in"))
    }

    /// Every minimum of a pipe, the governing one marked.
    fn write_reasons(&self, text: &mut String, reasons: &Reasons, index: usize) {
        line(text, "minimums:");
        let governing = reasons.governing(index);
        for reason in reasons.of(index) {
            let mark = if governing.is_some_and(|governing| std::ptr::eq(governing, reason)) { "->" } else { "  " };
            line(text, &format!("  {mark} {}", self.reason_words(reason)));
        }
        if governing.is_none() {
            line(text, "     nothing bears on it; the smallest size at hand");
        }
    }

    /// One minimum: what it says, the size, the clause and, where nobody has seen it in print, that.
    fn reason_words(&self, reason: &Reason) -> String {
        let citation = self.edition.citation(reason.citation);
        let mut text =
            format!("{:>5} in  {} ({})", reason.asks, says(&self.network, reason), self.clause(reason.citation));
        if !citation.witness.is_attested() {
            let _ = write!(text, " [{}]", citation.witness.words());
        }
        text
    }
}

fn line(text: &mut String, line: &str) {
    text.push_str("  ");
    text.push_str(line);
    text.push('\n');
}

fn traps(count: u32) -> String {
    if count == 1 { "1 trap".to_owned() } else { format!("{count} traps") }
}

fn vent_name_reason(name: VentName) -> &'static str {
    match name {
        VentName::Individual => "it protects one trap",
        VentName::Dual => "it protects two traps whose arms meet at its foot",
        VentName::Continuous => "it carries on from a drain that serves as a wet vent",
        VentName::Branch => "minor vents meet in it",
        VentName::StackVent => "it carries on from the top of a stack",
        VentName::VentStack => "it leaves a stack at or below its lowest connection",
        VentName::Header => "stack vents or vent stacks meet in it",
        VentName::Spare => "it protects no trap",
    }
}
