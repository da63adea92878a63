//! Plain questions to an edition, answered in plain text: for scripts, spreadsheet cells and checks against published tables.

use serde::{Deserialize, Serialize};

use super::{CitationId, Cited, Edition, Limit, Witness};
use crate::error::{Error, ErrorKind, Fault, FaultCode, nearest};
use crate::quantity::{FixtureUnits, FlowRate, Length, LengthUnit, PipeSize, Slope, SlopeNotation, Written};

/// A question to an edition, as JSON: `{ "ask": "vent-for-trap", "trap": "2" }`.
#[derive(Debug, Clone, PartialEq, Serialize, Deserialize)]
#[serde(tag = "ask", rename_all = "kebab-case", deny_unknown_fields)]
pub enum Question {
    /// The load of a kind of fixture, for a trap where it depends on that.
    FixtureLoad {
        /// The kind.
        fixture: String,
        /// The trap; not stated, that of the table.
        trap: Option<PipeSize>,
    },
    /// The least outlet of a kind of fixture.
    FixtureOutlet {
        /// The kind.
        fixture: String,
    },
    /// The load of a fixture that is not listed.
    LoadByTrap {
        /// The trap.
        trap: PipeSize,
    },
    /// The load of a semi-continuous flow.
    SemiContinuous {
        /// The trap.
        trap: PipeSize,
        /// The flow.
        flow: Written<FlowRate>,
    },
    /// The load of a whole bathroom group.
    BathroomGroup {
        /// Whether its water closet has a direct flush valve.
        flush_valve: bool,
    },
    /// What a stack takes in all.
    StackTotal {
        /// The size.
        size: PipeSize,
    },
    /// What a stack takes from one storey.
    StackOneStorey {
        /// The size.
        size: PipeSize,
    },
    /// What a branch takes.
    BranchCapacity {
        /// The size.
        size: PipeSize,
    },
    /// What a building drain or sewer takes.
    BuildingDrainCapacity {
        /// The size.
        size: PipeSize,
        /// The slope.
        slope: Written<Slope>,
    },
    /// The longest trap arm.
    TrapArmLongest {
        /// The size.
        size: PipeSize,
    },
    /// The least slope of a trap arm.
    TrapArmSlope {
        /// The size.
        size: PipeSize,
    },
    /// The least vent for the largest trap served.
    VentForTrap {
        /// The trap.
        trap: PipeSize,
    },
    /// What may drain to a wet vent.
    WetVentCapacity {
        /// The size.
        size: PipeSize,
        /// Whether it serves a water closet.
        water_closet: bool,
    },
    /// The longest stack vent or vent stack.
    StackVentLongest {
        /// The size of the stack at its foot.
        stack: PipeSize,
        /// The load.
        load: FixtureUnits,
        /// The size of the vent.
        vent: PipeSize,
    },
    /// The longest branch vent, header or continuous vent.
    VentLongest {
        /// The load.
        load: FixtureUnits,
        /// The size of the vent.
        vent: PipeSize,
    },
    /// The least slope of a drain.
    LeastSlope {
        /// The size.
        size: PipeSize,
    },
    /// The least drain for a load by its role, by the table of that role alone.
    DrainForLoad {
        /// The role.
        role: DrainRole,
        /// The load.
        load: FixtureUnits,
        /// The slope of a building drain; not stated, the least for the size.
        slope: Option<Written<Slope>>,
    },
    /// A rule's parameter.
    Rule {
        /// The name of the rule.
        name: String,
    },
}

/// What a drain does, for [`Question::DrainForLoad`].
#[derive(Debug, Clone, Copy, PartialEq, Eq, Serialize, Deserialize)]
#[serde(rename_all = "kebab-case")]
pub enum DrainRole {
    /// A branch or fixture drain.
    Branch,
    /// A stack, by its load in all.
    Stack,
    /// A stack, by the load of one storey.
    StackStorey,
    /// A building drain or sewer.
    BuildingDrain,
}

/// An answer with its source.
#[derive(Debug, Clone, PartialEq, Eq, Serialize)]
pub struct Answer {
    /// The answer: `6`, `1.8 m`, `1:50`, `not permitted`, `not limited`, `not known`.
    pub text: String,
    /// The clause or table with the edition.
    pub clause: String,
    /// How sure it is.
    pub witness: Witness,
}

impl Edition {
    /// Answers a question.
    ///
    /// # Errors
    /// A kind or rule that the edition does not have.
    pub fn answer(&self, question: &Question) -> Result<Answer, Error> {
        let (text, citation) = self.text_and_citation(question)?;
        let citation = citation.map(|citation| self.citation(citation));
        Ok(Answer {
            text,
            clause: citation
                .map_or_else(|| self.short.clone(), |citation| format!("{} {}", self.short, citation.clause)),
            witness: citation.map_or(Witness::Unsure, |citation| citation.witness),
        })
    }

    /// Answers a question that is written as JSON.
    ///
    /// # Errors
    /// A text that is no question, and what [`Edition::answer`] refuses.
    pub fn answer_json(&self, question: &str) -> Result<Answer, Error> {
        let question = serde_json::from_str(question).map_err(|error| {
            let message = format!("this is no question: {error}");
            let help = "write for example `{\"ask\": \"vent-for-trap\", \"trap\": \"2\"}`";
            Error::one(ErrorKind::Question, Fault::new(FaultCode::WrongFormat, "", message).help(help))
        })?;
        self.answer(&question)
    }

    fn text_and_citation(&self, question: &Question) -> Result<(String, Option<CitationId>), Error> {
        Ok(match question {
            Question::FixtureLoad { fixture, trap } => {
                let kind = self.kind(fixture)?;
                load(self.fixtures.load(kind, *trap))
            }
            Question::FixtureOutlet { fixture } => {
                let outlet = self.fixtures.row(self.kind(fixture)?).outlet;
                (outlet.value.to_string(), Some(outlet.citation))
            }
            Question::LoadByTrap { trap } => load(self.unlisted.load(*trap)),
            Question::SemiContinuous { trap, flow } => load(self.semi_continuous.load(*trap, flow.value)),
            Question::BathroomGroup { flush_valve } => load(
                self.bathroom_groups.iter().find(|group| group.flush_valve == *flush_valve).map(|group| group.load),
            ),
            Question::StackTotal { size } => load(self.stack.capacity(*size).map(|(total, _)| total)),
            Question::StackOneStorey { size } => load(self.stack.capacity(*size).map(|(_, one)| one)),
            Question::BranchCapacity { size } => load(self.branch.capacity(*size)),
            Question::BuildingDrainCapacity { size, slope } => match self.building_drain.capacity(*size, slope.value) {
                Some(capacity) => load(Some(capacity)),
                None => ("not permitted".to_owned(), self.building_drain.flattest(*size).map(|cell| cell.citation)),
            },
            Question::TrapArmLongest { size } => match self.trap_arm.row(*size) {
                Some(row) => (metres(row.longest), Some(row.longest_citation)),
                None => not_known(),
            },
            Question::TrapArmSlope { size } => match self.trap_arm.row(*size) {
                Some(row) => (ratio(row.least_slope), Some(row.slope_citation)),
                None => not_known(),
            },
            Question::VentForTrap { trap } => match self.vent_by_trap.vent_for(*trap) {
                Some(vent) => (vent.size.to_string(), Some(vent.citation)),
                None => not_known(),
            },
            Question::WetVentCapacity { size, water_closet } => {
                let row = self.wet_vent.rows.iter().find(|row| row.size == *size);
                let cited = row.map(|row| if *water_closet { row.with_citation } else { row.without_citation });
                let text = match self.wet_vent.capacity(*size, *water_closet) {
                    Limit::Most(most) => most.value.to_string(),
                    other => limit(&other),
                };
                (text, cited)
            }
            Question::StackVentLongest { stack, load, vent } => {
                let (longest, citation) = self.stack_vent.longest(*stack, *load, *vent);
                (longest_text(longest), citation)
            }
            Question::VentLongest { load, vent } => {
                let (longest, citation) = self.vent_length.longest(*load, *vent);
                (longest_text(longest), citation)
            }
            Question::LeastSlope { size } => {
                let slope = self.least_slope(*size);
                (ratio(slope.value), Some(slope.citation))
            }
            Question::DrainForLoad { role, load, slope } => self.drain_for_load(*role, *load, *slope),
            Question::Rule { name } => {
                let Some(rule) = self.rules.texts.iter().find(|rule| rule.name == *name) else {
                    let message = format!("{} has no rule `{name}`", self.short);
                    let names = self.rules.texts.iter().map(|rule| rule.name.as_str());
                    return Err(question_fault("name", message, nearest(name, names)));
                };
                let text = if rule.value.is_empty() { "holds".to_owned() } else { rule.value.clone() };
                (text, Some(rule.citation))
            }
        })
    }

    fn drain_for_load(
        &self,
        role: DrainRole,
        load: FixtureUnits,
        slope: Option<Written<Slope>>,
    ) -> (String, Option<CitationId>) {
        let sizes = self.pipe_sizes;
        let found = match role {
            DrainRole::Branch => self.branch.size_for(load, sizes),
            DrainRole::Stack => self.stack.size_for(load, FixtureUnits::ZERO, sizes).map(|(total, _)| total),
            DrainRole::StackStorey => self.stack.size_for(FixtureUnits::ZERO, load, sizes).map(|(_, one)| one),
            DrainRole::BuildingDrain => {
                let slope_of = |size: PipeSize| slope.map_or_else(|| self.least_slope(size).value, |slope| slope.value);
                sizes.iter().find_map(|size| {
                    let capacity = self.building_drain.capacity(size, slope_of(size))?;
                    (capacity.value >= load).then_some(super::TableSize { size, citation: capacity.citation })
                })
            }
        };
        match found {
            Some(found) => (found.size.to_string(), Some(found.citation)),
            None => ("beyond the table".to_owned(), None),
        }
    }

    fn kind(&self, key: &str) -> Result<super::FixtureKindId, Error> {
        self.fixtures.kind(key).ok_or_else(|| {
            let message = format!("{} lists no fixture of the kind `{key}`", self.short);
            let kinds = self.fixtures.rows.iter().map(|row| row.key.as_str());
            question_fault("fixture", message, nearest(key, kinds))
        })
    }
}

fn question_fault(path: &str, message: String, near: Option<&str>) -> Error {
    let fault = Fault::new(FaultCode::UnknownKind, path, message);
    Error::one(
        ErrorKind::Question,
        match near {
            Some(near) => fault.help(format!("did you mean `{near}`?")),
            None => fault,
        },
    )
}

fn load(load: Option<Cited<FixtureUnits>>) -> (String, Option<CitationId>) {
    match load {
        Some(load) => (load.value.to_string(), Some(load.citation)),
        None => not_known(),
    }
}

fn not_known() -> (String, Option<CitationId>) {
    ("not known".to_owned(), None)
}

fn limit<T>(limit: &Limit<T>) -> String {
    match limit {
        Limit::NotPermitted => "not permitted",
        Limit::NotKnown | Limit::Most(_) => "not known",
        Limit::NotLimited => "not limited",
    }
    .to_owned()
}

fn longest_text(longest: Limit<Length>) -> String {
    match longest {
        Limit::Most(length) => metres(length),
        other => limit(&other),
    }
}

fn metres(length: Length) -> String {
    length.in_unit(LengthUnit::Metre).to_string()
}

fn ratio(slope: Slope) -> String {
    slope.in_notation(SlopeNotation::Ratio).to_string()
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn questions_are_answered_from_json() {
        let edition = Edition::builtin("npc-2015").unwrap();
        let answer = edition.answer_json(r#"{"ask": "vent-for-trap", "trap": "2"}"#).unwrap();
        assert_eq!((answer.text.as_str(), answer.clause.as_str()), ("1-1/2", "NPC 2015 Table 2.5.7.1."));
        let error = edition.answer_json(r#"{"ask": "fixture-load", "fixture": "kichen-sink"}"#).unwrap_err();
        assert!(error.to_string().contains("did you mean `kitchen-sink`?"));
        assert!(edition.answer_json("{}").is_err());
        assert!(edition.answer_json(r#"{"ask": "rule", "name": "none"}"#).is_err());
    }
}
