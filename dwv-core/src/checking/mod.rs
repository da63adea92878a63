//! What breaks the code, and what cannot be decided: one file a check.
//!
//! A finding is kept as numbers and put into words when it is asked for. [`CHECKS`] is the one list of all checks; schedules,
//! faces and the documentation take them from there.

mod bathroom_group_incomplete;
mod drawn_size_too_small;
mod flat_slope_enlarges_pipe;
mod frost_not_stated;
mod length_missing;
mod load_beyond_table;
mod no_open_air_vent;
mod outlet_pipe_too_long;
mod sewer_invert_missing;
mod siphonic_arm_too_far;
mod slope_below_minimum;
mod stack_without_stack_vent;
mod stated_name_contradicted;
mod terminal_height_missing;
mod terminal_too_low;
mod three_inch_vent_missing;
mod trap_arm_falls_too_far;
mod trap_arm_not_in_table;
mod trap_arm_too_long;
mod trap_arm_too_short;
mod trap_arm_turns_too_much;
mod trap_without_vent;
mod valve_without_grounds;
mod vent_stack_missing;
mod vent_table_not_in_print;
mod wet_vent_arm_too_large;
mod wet_vent_closet_upstream;
mod wet_vent_too_many_closets;
mod wet_vent_upper_storey;

use serde::Serialize;

use crate::edition::{CitationId, Edition};
use crate::grading::Grades;
use crate::network::{DrainId, FixtureId, VentId};
use crate::quantity::{Length, LengthUnit};
use crate::sizing::{Operands, Sizes};

/// How grave a finding is.
#[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash, Serialize)]
#[cfg_attr(feature = "schema", derive(schemars::JsonSchema))]
#[serde(rename_all = "kebab-case")]
pub enum Severity {
    /// The drawing breaks a clause.
    Violation,
    /// The drawing lacks what a rule needs, or the authority decides.
    CannotDecide,
    /// Something to know.
    Caution,
}

impl Severity {
    /// The stable name.
    #[must_use]
    pub fn name(self) -> &'static str {
        match self {
            Self::Violation => "violation",
            Self::CannotDecide => "cannot-decide",
            Self::Caution => "caution",
        }
    }
}

/// What a finding is about.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum Subject {
    /// The whole drawing.
    Layout,
    /// A drain.
    Drain(DrainId),
    /// A vent.
    Vent(VentId),
    /// A fixture.
    Fixture(FixtureId),
    /// A terminal, by number.
    Terminal(u32),
    /// An air admittance valve, by number.
    Valve(u32),
    /// A bathroom group, by number.
    Group(u32),
}

/// Something found, as numbers.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub struct Finding {
    /// The check, by its place in [`CHECKS`].
    pub check: u16,
    /// How grave it is.
    pub severity: Severity,
    /// What it is about.
    pub subject: Subject,
    /// The measured value; its meaning goes with the check.
    pub found: i64,
    /// The limit; its meaning goes with the check.
    pub limit: i64,
}

/// A check.
#[derive(Clone, Copy)]
pub struct Check {
    /// Its stable name: what it finds.
    pub name: &'static str,
    /// What it finds, in a sentence.
    pub finds: &'static str,
    /// Why it matters.
    pub matters: &'static str,
    /// How to mend it.
    pub remedy: &'static str,
    /// Its clause in an edition.
    pub(crate) citation: fn(&Edition) -> CitationId,
    /// Looks for it.
    pub(crate) run: fn(&Case<'_>, &mut Report<'_>),
    /// Says one finding in words.
    pub(crate) words: fn(&Case<'_>, &Finding) -> String,
}

/// Every check, in the order of their reports.
pub const CHECKS: [Check; 29] = [
    trap_without_vent::CHECK,
    trap_arm_too_long::CHECK,
    trap_arm_too_short::CHECK,
    trap_arm_falls_too_far::CHECK,
    trap_arm_turns_too_much::CHECK,
    trap_arm_not_in_table::CHECK,
    siphonic_arm_too_far::CHECK,
    outlet_pipe_too_long::CHECK,
    slope_below_minimum::CHECK,
    flat_slope_enlarges_pipe::CHECK,
    drawn_size_too_small::CHECK,
    load_beyond_table::CHECK,
    wet_vent_too_many_closets::CHECK,
    wet_vent_closet_upstream::CHECK,
    wet_vent_arm_too_large::CHECK,
    wet_vent_upper_storey::CHECK,
    stack_without_stack_vent::CHECK,
    vent_stack_missing::CHECK,
    three_inch_vent_missing::CHECK,
    no_open_air_vent::CHECK,
    valve_without_grounds::CHECK,
    terminal_too_low::CHECK,
    terminal_height_missing::CHECK,
    length_missing::CHECK,
    sewer_invert_missing::CHECK,
    vent_table_not_in_print::CHECK,
    bathroom_group_incomplete::CHECK,
    stated_name_contradicted::CHECK,
    frost_not_stated::CHECK,
];

/// Whether the trap of a fixture needs no vent.
pub(crate) use trap_without_vent::is_exempt as is_exempt_from_vent;

/// The check with this name.
#[must_use]
pub fn check(name: &str) -> Option<&'static Check> {
    CHECKS.iter().find(|check| check.name == name)
}

/// What checks look at.
#[derive(Clone, Copy)]
pub(crate) struct Case<'a> {
    pub(crate) operands: Operands<'a>,
    pub(crate) sizes: &'a Sizes,
    pub(crate) grades: &'a Grades,
    /// The trap arm of every fixture whose trap has air.
    pub(crate) arms: &'a [Arm],
}

impl Case<'_> {
    /// A length as messages show it.
    pub(crate) fn length(&self, nanometres: i64) -> String {
        Length::from_nanometres(nanometres).rounded(self.length_unit()).to_string()
    }

    pub(crate) fn length_unit(&self) -> LengthUnit {
        self.operands.network.length_unit
    }
}

/// The arm of a trap or, for a trap without air, its fixture drain: measured.
#[derive(Debug, Clone, Copy)]
pub(crate) struct Arm {
    pub(crate) fixture: FixtureId,
    pub(crate) end: DrainId,
    pub(crate) siphonic: bool,
    /// Its developed length, as far as it is known.
    pub(crate) length: Length,
    pub(crate) length_missing: bool,
    pub(crate) fall: Length,
    /// The drop of its vertical parts.
    pub(crate) vertical: Length,
    pub(crate) turns: u16,
}

impl Arm {
    /// Measures the way from a trap to the end of a pipe downstream.
    pub(crate) fn measure(operands: &Operands<'_>, grades: &Grades, fixture: FixtureId, end: DrainId) -> Self {
        let (drains, fixtures) = (&operands.network.drains, &operands.network.fixtures);
        let kind = fixtures.kind[fixture.index()];
        let mut arm = Self {
            fixture,
            end,
            siphonic: kind.is_some_and(|kind| operands.edition.fixtures.row(kind).siphonic),
            length: Length::ZERO,
            length_missing: false,
            fall: Length::ZERO,
            vertical: Length::ZERO,
            turns: 0,
        };
        let mut pipe = Some(fixtures.drain[fixture.index()]);
        while let Some(at) = pipe {
            let index = at.index();
            match drains.length[index] {
                Some(length) => arm.length = arm.length + length,
                None => arm.length_missing = true,
            }
            let fall = grades.fall[index].unwrap_or(Length::ZERO);
            arm.fall = arm.fall + fall;
            if drains.vertical[index] {
                arm.vertical = arm.vertical + fall;
            }
            arm.turns = arm.turns.saturating_add(drains.turns[index].unwrap_or(0));
            pipe = drains.next[index].filter(|_| at != end);
        }
        arm
    }

    /// The arm of a fixture's trap; none when no air reaches it.
    pub(crate) fn of(operands: &Operands<'_>, grades: &Grades, fixture: FixtureId) -> Option<Self> {
        let trap = operands.names.trap[fixture.index()];
        trap.vent?;
        Some(Self::measure(operands, grades, fixture, trap.arm_end))
    }
}

/// Takes findings of one check.
pub(crate) struct Report<'a> {
    check: u16,
    list: &'a mut Vec<Finding>,
}

impl Report<'_> {
    pub(crate) fn add(&mut self, severity: Severity, subject: Subject, found: i64, limit: i64) {
        self.list.push(Finding { check: self.check, severity, subject, found, limit });
    }

    pub(crate) fn violation(&mut self, subject: Subject, found: i64, limit: i64) {
        self.add(Severity::Violation, subject, found, limit);
    }
}

/// All findings.
#[derive(Debug, Clone, Default)]
pub struct Findings {
    /// In the order of the checks, and within one of the drawing.
    pub list: Vec<Finding>,
    arms: Vec<Arm>,
}

impl Findings {
    pub(crate) fn arms(&self) -> &[Arm] {
        &self.arms
    }

    /// Runs every check.
    pub fn find(&mut self, operands: &Operands<'_>, sizes: &Sizes, grades: &Grades) {
        self.list.clear();
        self.arms.clear();
        let fixtures = (0..operands.network.fixtures.len()).map(FixtureId::new);
        self.arms.extend(fixtures.filter_map(|fixture| Arm::of(operands, grades, fixture)));
        let case = Case { operands: *operands, sizes, grades, arms: &self.arms };
        for (index, check) in CHECKS.iter().enumerate() {
            let mut report = Report { check: index as u16, list: &mut self.list };
            (check.run)(&case, &mut report);
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn every_check_says_what_it_finds_why_and_what_to_do() {
        for check in CHECKS {
            assert!(!check.name.is_empty() && check.name.bytes().all(|byte| byte.is_ascii_lowercase() || byte == b'-'));
            assert!(check.finds.len() > 15 && check.matters.len() > 15 && check.remedy.len() > 10, "{}", check.name);
        }
    }

    #[test]
    fn names_are_used_once() {
        for (index, one) in CHECKS.iter().enumerate() {
            assert!(CHECKS[index + 1..].iter().all(|other| other.name != one.name), "{}", one.name);
        }
    }
}
