//! A vent that is sized by a table known from memory only (NPC 2015, Table 2.5.8.3.).

use super::{Case, Check, Finding, Report, Severity, Subject};
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

/// One finding for all of them: each such vent is marked as provisional in its row.
fn run(case: &Case<'_>, report: &mut Report<'_>) {
    let count = unsure(case).count();
    if count > 0 {
        report.add(Severity::CannotDecide, Subject::Layout, count as i64, 0);
    }
}

/// The vents whose size the table bears on.
fn unsure<'a>(case: &'a Case<'_>) -> impl Iterator<Item = usize> + 'a {
    (0..case.operands.network.vents.len()).filter(|vent| {
        case.sizes.vent_reasons.of(*vent).iter().any(|reason| {
            reason.rule == Rule::VentLength && !case.operands.edition.witness(reason.citation).is_attested()
        })
    })
}

fn words(case: &Case<'_>, finding: &Finding) -> String {
    const SHOWN: usize = 12;
    let ids: Vec<String> =
        unsure(case).take(SHOWN).map(|vent| format!("`{}`", case.operands.network.vents.id[vent])).collect();
    let more = if finding.found as usize > SHOWN { " …" } else { "" };
    let sizes = match finding.found {
        1 => "the size of 1 vent is provisional, for its table".to_owned(),
        count => format!("the sizes of {count} vents are provisional, for their table"),
    };
    format!("{sizes} is known from memory only: {}{more}", ids.join(", "))
}
