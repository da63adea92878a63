//! A vent that is sized by a table known from memory only (NPC 2015, Table 2.5.8.3.).

use super::{Case, Check, Finding, Report, Severity, Subject};
use crate::network::VentId;
use crate::sizing::Rule;

pub(super) const CHECK: Check = Check {
    name: "vent-table-not-in-print",
    finds: "a vent sized by a table that nobody here has seen in print",
    matters: "its size is provisional until the table is checked",
    remedy: "compare the size with the printed table before building",
    citation: |edition| edition.readings.vent_length.citation,
    run,
    words,
};

fn run(case: &Case<'_>, report: &mut Report<'_>) {
    for index in 0..case.operands.network.vents.len() {
        let reasons = case.sizes.vent_reasons.of(index);
        let unsure = reasons.iter().any(|reason| {
            let witness = case.operands.edition.citation(reason.citation).witness;
            reason.rule == Rule::VentLength && !witness.is_attested()
        });
        if unsure {
            report.add(Severity::CannotDecide, Subject::Vent(VentId::new(index)), 0, 0);
        }
    }
}

fn words(case: &Case<'_>, finding: &Finding) -> String {
    let Subject::Vent(vent) = finding.subject else { return String::new() };
    format!(
        "the size of the vent `{}`, {} in, is provisional: its table is known from memory only",
        case.operands.network.vents.id[vent.index()],
        case.sizes.vent[vent.index()]
    )
}
