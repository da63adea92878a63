//! An air admittance valve without grounds (NPC 2015, 2.5.9.2.(1)).

use super::{Case, Check, Finding, Report, Severity, Subject};
use crate::layout::Grounds;

pub(super) const CHECK: Check = Check {
    name: "valve-without-grounds",
    finds: "an air admittance valve whose grounds are not stated, or are for the authority to accept",
    matters: "valves are permitted in four cases only",
    remedy: "state `grounds`, or lead the vent to open air",
    citation: |edition| edition.rules.valve_grounds.citation,
    run,
    words,
};

fn run(case: &Case<'_>, report: &mut Report<'_>) {
    for (index, valve) in case.operands.network.valves.iter().enumerate() {
        let subject = Subject::Valve(index as u32);
        match valve.grounds {
            None => report.violation(subject, 0, 0),
            Some(Grounds::NotPractical) => report.add(Severity::CannotDecide, subject, 1, 0),
            Some(_) => {}
        }
    }
}

fn words(case: &Case<'_>, finding: &Finding) -> String {
    let Subject::Valve(valve) = finding.subject else { return String::new() };
    let id = &case.operands.network.valves[valve as usize].id;
    match finding.found {
        0 => format!("the air admittance valve `{id}` states no grounds"),
        _ => format!("the authority decides whether connection to a vent is not practical at the valve `{id}`"),
    }
}
