//! A load or length beyond the tables or the sizes at hand.

use super::{Case, Check, Finding, Report, Subject};
use crate::quantity::FixtureUnits;

pub(super) const CHECK: Check = Check {
    name: "load-beyond-table",
    finds: "a pipe whose load or length is beyond the tables of the edition or the sizes at hand",
    matters: "no size of the edition takes it, so the largest is shown and is not enough",
    remedy: "divide the load over more pipes, shorten the vent, or allow larger sizes",
    citation: |edition| edition.rules.total_load.citation,
    run,
    words,
};

fn run(case: &Case<'_>, report: &mut Report<'_>) {
    for drain in &case.sizes.drain_beyond {
        report.violation(Subject::Drain(*drain), case.operands.loads.load[drain.index()].thousandths() as i64, 0);
    }
    for vent in &case.sizes.vent_beyond {
        report.violation(Subject::Vent(*vent), case.operands.vent_loads.load[vent.index()].thousandths() as i64, 0);
    }
}

fn words(case: &Case<'_>, finding: &Finding) -> String {
    let load = FixtureUnits::from_thousandths(u64::try_from(finding.found).unwrap_or(0));
    match finding.subject {
        Subject::Drain(drain) => format!(
            "no size of the tables takes the load of the drain `{}`, {load} FU, as it is named, sloped and vented",
            case.operands.network.drains.id[drain.index()]
        ),
        Subject::Vent(vent) => format!(
            "no size of the tables takes the vent `{}`, {load} FU over {}",
            case.operands.network.vents.id[vent.index()],
            case.operands.vent_loads.length[vent.index()].rounded(case.length_unit())
        ),
        _ => String::new(),
    }
}
