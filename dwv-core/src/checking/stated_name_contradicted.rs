//! A stated name that the drawing contradicts.

use super::{Case, Check, Finding, Report, Subject};
use crate::layout::StatedName;
use crate::naming::{DrainName, VentName};
use crate::network::{DrainId, VentId};

pub(super) const CHECK: Check = Check {
    name: "stated-name-contradicted",
    finds: "a pipe whose stated name is not what the drawing makes it",
    matters: "the name chooses the table, so a wrong one gives a wrong size",
    remedy: "correct the name or the drawing",
    citation: |edition| edition.rules.storey_allowance.citation,
    run,
    words,
};

fn run(case: &Case<'_>, report: &mut Report<'_>) {
    let Case { operands, .. } = case;
    for (index, stated) in operands.network.drains.stated_name.iter().enumerate() {
        let Some(stated) = stated else { continue };
        let agrees = match stated {
            StatedName::TrapArm => operands.names.trap_arm[index],
            StatedName::FixtureDrain => operands.names.drain[index] == DrainName::FixtureDrain,
            StatedName::Branch => operands.names.drain[index] == DrainName::Branch,
            StatedName::Stack => operands.names.drain[index] == DrainName::Stack,
            StatedName::BuildingDrain => operands.names.drain[index] == DrainName::BuildingDrain,
            StatedName::BuildingSewer => operands.names.drain[index] == DrainName::BuildingSewer,
            _ => false,
        };
        if !agrees {
            report.violation(Subject::Drain(DrainId::new(index)), 0, 0);
        }
    }
    for (index, stated) in operands.network.vents.stated_name.iter().enumerate() {
        let Some(stated) = stated else { continue };
        let name = operands.names.vent[index].name;
        let agrees = match stated {
            StatedName::IndividualVent => name == VentName::Individual,
            StatedName::DualVent => name == VentName::Dual,
            StatedName::ContinuousVent => name == VentName::Continuous,
            StatedName::BranchVent => name == VentName::Branch,
            StatedName::StackVent => name == VentName::StackVent,
            StatedName::VentStack => name == VentName::VentStack,
            StatedName::VentHeader => name == VentName::Header,
            _ => false,
        };
        if !agrees {
            report.violation(Subject::Vent(VentId::new(index)), 0, 0);
        }
    }
}

fn words(case: &Case<'_>, finding: &Finding) -> String {
    let network = case.operands.network;
    let (id, stated, found) = match finding.subject {
        Subject::Drain(drain) => {
            let index = drain.index();
            let found = crate::explain::drain_name(case.operands.names, drain);
            (&network.drains.id[index], network.drains.stated_name[index], found)
        }
        Subject::Vent(vent) => {
            let index = vent.index();
            let found = crate::explain::vent_name(case.operands.names.vent[index].name);
            (&network.vents.id[index], network.vents.stated_name[index], found)
        }
        _ => return String::new(),
    };
    let stated = stated.map_or("?", crate::explain::stated_name);
    format!("`{id}` is stated to be a {stated}, but the drawing makes it a {found}")
}
