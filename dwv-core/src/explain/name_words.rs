//! Names in the code's terms.

use crate::layout::StatedName;
use crate::naming::{DrainName, NameReason, Names, VentName};
use crate::network::{DrainId, Network};

/// What a drain is called.
#[must_use]
pub fn drain_name(names: &Names, drain: DrainId) -> &'static str {
    let index = drain.index();
    match names.drain[index] {
        DrainName::FixtureDrain if names.trap_arm[index] => "trap arm",
        DrainName::FixtureDrain => "fixture drain",
        DrainName::Branch => "branch",
        DrainName::Stack => {
            let soil = names.stack_of[index].is_some_and(|stack| names.stacks[stack.0 as usize].soil);
            match (soil, names.reason[index]) {
                (true, NameReason::StackOffset) => "soil stack offset",
                (false, NameReason::StackOffset) => "waste stack offset",
                (true, _) => "soil stack",
                (false, _) => "waste stack",
            }
        }
        DrainName::BuildingDrain => "building drain",
        DrainName::BuildingSewer => "building sewer",
    }
}

/// What a vent is called.
#[must_use]
pub fn vent_name(name: VentName) -> &'static str {
    match name {
        VentName::Individual => "individual vent",
        VentName::Dual => "dual vent",
        VentName::Continuous => "continuous vent",
        VentName::Branch => "branch vent",
        VentName::StackVent => "stack vent",
        VentName::VentStack => "vent stack",
        VentName::Header => "vent header",
        VentName::Spare => "spare vent",
    }
}

/// What the user calls a pipe.
#[must_use]
pub fn stated_name(name: StatedName) -> &'static str {
    match name {
        StatedName::TrapArm => "trap arm",
        StatedName::FixtureDrain => "fixture drain",
        StatedName::Branch => "branch",
        StatedName::Stack => "stack",
        StatedName::BuildingDrain => "building drain",
        StatedName::BuildingSewer => "building sewer",
        StatedName::IndividualVent => "individual vent",
        StatedName::DualVent => "dual vent",
        StatedName::ContinuousVent => "continuous vent",
        StatedName::BranchVent => "branch vent",
        StatedName::StackVent => "stack vent",
        StatedName::VentStack => "vent stack",
        StatedName::VentHeader => "vent header",
    }
}

/// Why a drain is called what it is called.
#[must_use]
pub fn name_reason(network: &Network, names: &Names, drain: DrainId) -> String {
    let index = drain.index();
    match names.reason[index] {
        NameReason::OneTrap => "it carries the water of one trap".to_owned(),
        NameReason::SeveralTraps => "it carries the water of several traps to a stack or the building drain".to_owned(),
        NameReason::BelowStack => "it leads on from the foot of a stack".to_owned(),
        NameReason::NoTrap => "it carries no water of a trap".to_owned(),
        NameReason::PassesStorey | NameReason::StackOffset => {
            let Some(stack) = names.stack_of[index] else { return String::new() };
            let stack = names.stacks[stack.0 as usize];
            let drains = &network.drains;
            let part = if names.reason[index] == NameReason::StackOffset {
                "it is a level offset of the line"
            } else {
                "it is part of the vertical line"
            };
            let storeys = if stack.storeys == 1 { "1 storey".to_owned() } else { format!("{} storeys", stack.storeys) };
            format!(
                "{part} from `{}` at {} to `{}` at {}, which passes {storeys}",
                drains.from[stack.top.index()],
                drains.top[stack.top.index()].rounded(network.length_unit),
                drains.to[stack.foot.index()],
                drains.foot[stack.foot.index()].rounded(network.length_unit),
            )
        }
        NameReason::Outside => "it lies outside, beyond the first metre from the wall".to_owned(),
        NameReason::RemoteSoilStack => {
            "it is on the way from the foot of the most remote soil stack to the sewer, the reading in force".to_owned()
        }
        NameReason::RemoteStack => "it is on the way from the foot of the most remote stack to the sewer".to_owned(),
        NameReason::HighestJunction => {
            "there is no stack, and it is on the way from the most remote junction that counts to the sewer".to_owned()
        }
        NameReason::StatedEnd => "the drawing says where the building drain ends upstream".to_owned(),
    }
}
