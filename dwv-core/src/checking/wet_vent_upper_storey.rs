//! Too much load from an upper storey on a wet vent (NPC 2015, 2.5.2.1.(1)(h)).

use super::{Case, Check, Finding, Report, Subject};
use crate::network::DrainId;
use crate::quantity::FixtureUnits;

pub(super) const CHECK: Check = Check {
    name: "wet-vent-upper-storey",
    finds: "a wet vent through several storeys that takes too much from one above the lowest",
    matters: "waste that falls past the fixtures below pushes and pulls their seals",
    remedy: "give the fixtures of that storey vents of their own",
    citation: |edition| edition.rules.wet_vent_upper_storey.citation,
    run,
    words,
};

/// For each wet vent that is a stack: what enters it on each storey above the lowest that it serves.
fn run(case: &Case<'_>, report: &mut Report<'_>) {
    let operands = &case.operands;
    let drains = &operands.network.drains;
    let most = operands.edition.rules.wet_vent_upper_storey.value;
    for index in 0..drains.len() {
        let drain = DrainId::new(index);
        let Some(end) = operands.names.wet_end[index] else { continue };
        if operands.names.stack_of[index].is_none() {
            continue;
        }
        // The lowest storey is that of the joint where the wet vent ends.
        let lowest = drains.next[end.index()].map_or(drains.storey[index], |next| drains.storey[next.index()]);
        let last_of_storey = drains.next[index].is_none_or(|next| drains.storey[next.index()] != drains.storey[index]);
        if drains.storey[index] <= lowest || !last_of_storey {
            continue;
        }
        let load = operands.stack_loads.on_storey(drain);
        if load > most {
            report.violation(Subject::Drain(drain), load.thousandths() as i64, most.thousandths() as i64);
        }
    }
}

fn words(case: &Case<'_>, finding: &Finding) -> String {
    let Subject::Drain(drain) = finding.subject else { return String::new() };
    let units = |thousandths: i64| FixtureUnits::from_thousandths(u64::try_from(thousandths).unwrap_or(0));
    let network = case.operands.network;
    let storey = usize::from(network.drains.storey[drain.index()].0);
    format!(
        "the stack serves as wet vent at `{}` and takes {} FU from the storey `{}`, at most {} FU is allowed above the lowest",
        network.drains.id[drain.index()],
        units(finding.found),
        network.levels.get(storey).map_or("?", |level| level.id.as_str()),
        units(finding.limit)
    )
}
