//! A sewer connection whose invert is not stated.

use super::{Case, Check, Finding, Report, Severity, Subject};

pub(super) const CHECK: Check = Check {
    name: "sewer-invert-missing",
    finds: "a sewer connection whose invert is not stated",
    matters: "no invert of the piping can be given without it",
    remedy: "state `invert` of the sewer connection",
    citation: |edition| edition.rules.least_slope_small.citation,
    run,
    words,
};

fn run(case: &Case<'_>, report: &mut Report<'_>) {
    if case.operands.network.sewer_invert.is_none() {
        report.add(Severity::CannotDecide, Subject::Layout, 0, 0);
    }
}

fn words(case: &Case<'_>, _: &Finding) -> String {
    format!(
        "the invert of the sewer connection `{}` is not stated, so no invert can be given",
        case.operands.network.sewer_joint
    )
}
