//! Findings as rows.

use serde::Serialize;

use crate::Sizing;
use crate::checking::{CHECKS, Case, Severity, Subject};
use crate::sizing::Operands;
use crate::sizing_run::Unattested;

use super::Status;

/// Something that breaks the code, or that cannot be decided.
#[derive(Debug, Clone, PartialEq, Eq, Serialize)]
#[cfg_attr(feature = "schema", derive(schemars::JsonSchema))]
pub struct FindingRow {
    /// The stable name of the check.
    pub check: &'static str,
    /// How grave it is.
    pub severity: Severity,
    /// The id of the element; none for the whole drawing.
    pub element: Option<String>,
    /// What was found, in words.
    pub message: String,
    /// How to mend it.
    pub remedy: String,
    /// The clause.
    pub clause: String,
}

impl Sizing {
    /// Looks at the columns as checks do.
    pub(crate) fn case<T>(&self, look: impl FnOnce(&Case<'_>) -> T) -> T {
        let columns = &self.columns;
        let operands = Operands {
            network: &self.network,
            edition: &self.edition,
            names: &columns.names,
            loads: &columns.loads,
            stack_loads: &columns.stack_loads,
            vent_loads: &columns.vent_loads,
            wet_loads: &columns.wet_loads,
        };
        let arms = columns.findings.arms();
        look(&Case { operands, sizes: &columns.sizes, grades: &columns.grades, arms })
    }

    /// All findings, in the order of the checks.
    #[must_use]
    pub fn findings(&self) -> Vec<FindingRow> {
        let mut rows: Vec<FindingRow> = self.case(|case| {
            let row = |finding: &crate::checking::Finding| {
                let check = &CHECKS[usize::from(finding.check)];
                FindingRow {
                    check: check.name,
                    severity: finding.severity,
                    element: self.element(finding.subject),
                    message: (check.words)(case, finding),
                    remedy: check.remedy.to_owned(),
                    clause: self.clause((check.citation)(&self.edition)),
                }
            };
            self.columns.findings.list.iter().map(row).collect()
        });
        // Findings about terminals, valves and groups follow the file; by element they do not.
        rows.sort_by(|left, right| {
            let place = |row: &FindingRow| CHECKS.iter().position(|check| check.name == row.check);
            place(left).cmp(&place(right)).then_with(|| left.element.cmp(&right.element))
        });
        if self.unattested == Unattested::Refuse {
            rows.extend(self.refused());
        }
        rows
    }

    fn element(&self, subject: Subject) -> Option<String> {
        let network = &self.network;
        match subject {
            Subject::Layout => None,
            Subject::Drain(drain) => Some(network.drains.id[drain.index()].to_string()),
            Subject::Vent(vent) => Some(network.vents.id[vent.index()].to_string()),
            Subject::Fixture(fixture) => Some(network.fixtures.id[fixture.index()].to_string()),
            Subject::Terminal(terminal) => Some(network.terminals[terminal as usize].id.to_string()),
            Subject::Valve(valve) => Some(network.valves[valve as usize].id.to_string()),
            Subject::Group(group) => Some(network.groups[group as usize].name.to_string()),
        }
    }

    /// Sizes that are not given because unattested values are refused.
    fn refused(&self) -> Vec<FindingRow> {
        let drains = self.pipes().into_iter().map(|row| (row.id, row.status, row.governed_by, row.clause));
        let vents = self.vents().into_iter().map(|row| (row.id, row.status, row.governed_by, row.clause));
        let ends = self.terminals().into_iter().map(|row| (row.id, row.status, row.governed_by, row.clause));
        drains
            .chain(vents)
            .chain(ends)
            .filter(|(_, status, ..)| *status == Status::CannotDecide)
            .map(|(id, _, governed_by, clause)| FindingRow {
                check: "value-not-in-print",
                severity: Severity::CannotDecide,
                message: format!("the size of `{id}` rests on a value that nobody here has seen in print, or on what is missing: {governed_by}"),
                element: Some(id),
                remedy: "compare the value with the adopted text, then size with `unattested` as `tell`".to_owned(),
                clause,
            })
            .collect()
    }
}
