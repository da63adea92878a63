//! A pipe drawn smaller than its minimums ask.

use super::{Case, Check, Finding, Report, Subject};
use crate::network::{DrainId, VentId};
use crate::quantity::PipeSize;

pub(super) const CHECK: Check = Check {
    name: "drawn-size-too-small",
    finds: "a pipe whose size on the drawing is smaller than a clause asks",
    matters: "it is smaller than the code asks for what it carries",
    remedy: "draw it at the size of the schedule",
    citation: |edition| edition.rules.no_smaller_than_upstream.citation,
    run,
    words,
};

fn run(case: &Case<'_>, report: &mut Report<'_>) {
    let network = case.operands.network;
    for (index, stated) in network.drains.stated_size.iter().enumerate() {
        if let Some(stated) = stated
            && case.sizes.drain[index] > *stated
        {
            let needed = case.sizes.drain[index].index() as i64;
            report.violation(Subject::Drain(DrainId::new(index)), stated.index() as i64, needed);
        }
    }
    for (index, stated) in network.vents.stated_size.iter().enumerate() {
        if let Some(stated) = stated
            && case.sizes.vent[index] > *stated
        {
            let needed = case.sizes.vent[index].index() as i64;
            report.violation(Subject::Vent(VentId::new(index)), stated.index() as i64, needed);
        }
    }
}

fn words(case: &Case<'_>, finding: &Finding) -> String {
    let size = |index: i64| usize::try_from(index).ok().and_then(PipeSize::from_index).map_or("?", PipeSize::text);
    let (word, id) = match finding.subject {
        Subject::Drain(drain) => ("drain", &case.operands.network.drains.id[drain.index()]),
        Subject::Vent(vent) => ("vent", &case.operands.network.vents.id[vent.index()]),
        _ => return String::new(),
    };
    format!("the {word} `{id}` is drawn {} in and must be {} in", size(finding.found), size(finding.limit))
}
