//! Frost that the drawing does not speak of (NPC 2015, 2.5.6.5.(6)).

use super::{Case, Check, Finding, Report, Severity, Subject};
use crate::layout::Through;

pub(super) const CHECK: Check = Check {
    name: "frost-not-stated",
    finds: "a drawing that does not say whether frost can close its vents",
    matters: "vents through the roof are enlarged to be safe",
    remedy: "state `frost_can_close_vents`",
    citation: |edition| edition.rules.vent_frost.citation,
    run,
    words,
};

fn run(case: &Case<'_>, report: &mut Report<'_>) {
    let network = case.operands.network;
    let roof = network.terminals.iter().any(|terminal| terminal.through == Through::Roof);
    if network.frost_can_close_vents.is_none() && roof {
        report.add(Severity::Caution, Subject::Layout, 0, 0);
    }
}

fn words(_: &Case<'_>, _: &Finding) -> String {
    "the layout does not say whether frost can close vents, so vents through the roof are enlarged".to_owned()
}
