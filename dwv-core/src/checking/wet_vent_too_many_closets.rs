//! More water closets on a wet vent than allowed (NPC 2015, 2.5.2.1.(1)).

use super::{Case, Check, Finding, Report, Subject};
use crate::network::DrainId;

pub(super) const CHECK: Check = Check {
    name: "wet-vent-too-many-closets",
    finds: "a wet vent that serves more water closets than the edition allows",
    matters: "two closets flushed together fill the pipe that others breathe through",
    remedy: "give a water closet a vent of its own",
    citation: |edition| edition.rules.wet_vent_water_closets.citation,
    run,
    words,
};

fn run(case: &Case<'_>, report: &mut Report<'_>) {
    let most = case.operands.edition.rules.wet_vent_water_closets.value;
    for (index, closets) in case.operands.wet_loads.water_closets.iter().enumerate() {
        if *closets > most {
            report.violation(Subject::Drain(DrainId::new(index)), i64::from(*closets), i64::from(most));
        }
    }
}

fn words(case: &Case<'_>, finding: &Finding) -> String {
    let Subject::Drain(drain) = finding.subject else { return String::new() };
    format!(
        "the wet vent that ends with the drain `{}` serves {} water closets, at most {} are allowed",
        case.operands.network.drains.id[drain.index()],
        finding.found,
        finding.limit
    )
}
