//! A pipe whose length is not known.

use super::{Case, Check, Finding, Report, Severity, Subject};
use crate::loading::VentLoads;
use crate::network::{DrainId, VentId};

pub(super) const CHECK: Check = Check {
    name: "length-missing",
    finds: "a pipe whose length is needed and neither stated nor drawn",
    matters: "fall, inverts, trap arm or developed length cannot be judged without it",
    remedy: "state `length`, or give both ends positions",
    citation: |edition| edition.rules.branch_vent_inputs.citation,
    run,
    words,
};

/// Vents that go by the largest trap alone need no length of their own, but what runs through them does.
fn run(case: &Case<'_>, report: &mut Report<'_>) {
    let network = case.operands.network;
    for (index, length) in network.drains.length.iter().enumerate() {
        if length.is_none() {
            report.add(Severity::CannotDecide, Subject::Drain(DrainId::new(index)), 0, 0);
        }
    }
    for (index, length) in network.vents.length.iter().enumerate() {
        let counts = VentLoads::length_counts(case.operands.names.vent[index].name);
        let joined = network.vents.next[index]
            .is_some_and(|next| VentLoads::length_counts(case.operands.names.vent[next.index()].name));
        if length.is_none() && (counts || joined) {
            report.add(Severity::CannotDecide, Subject::Vent(VentId::new(index)), 0, 0);
        }
    }
}

fn words(case: &Case<'_>, finding: &Finding) -> String {
    match finding.subject {
        Subject::Drain(drain) => format!(
            "the length of the drain `{}` is not known, so neither are its fall and the inverts upstream",
            case.operands.network.drains.id[drain.index()]
        ),
        Subject::Vent(vent) => format!(
            "the length of the vent `{}` is not known, so the vents that are measured along it may have to be larger",
            case.operands.network.vents.id[vent.index()]
        ),
        _ => String::new(),
    }
}
