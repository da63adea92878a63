//! What hangs loose in a drawing: a sewer connection that nothing reaches, drains that carry nothing, vents that begin nowhere.

use super::build::Build;
use super::drain_order::{DrainOrder, Ends};
use super::register::Element;
use super::vent_order::{VentEnds, VentOrder};
use crate::error::{Fault, FaultCode, Faults};

impl Build<'_> {
    pub(super) fn check_sewer(&self, sewer: Option<u32>, ends: &Ends, vents: &VentOrder, faults: &mut Faults) {
        let Some(sewer) = sewer else { return };
        let id = &self.layout.sewer.at;
        if !ends.to.contains(&Some(sewer)) {
            let message = format!("no drain ends at the sewer connection `{id}`");
            let fault = Fault::new(FaultCode::ReachesNoSewer, "sewer.at", message);
            faults.push(fault.help("lead the building's piping to it, or name the joint where it ends"));
        }
        if let Some(drain) = ends.from.iter().position(|from| *from == Some(Element::Joint(sewer))) {
            let drain_id = &self.layout.drains[drain].id;
            let message = format!("the drain `{drain_id}` leaves the sewer connection `{id}`, where the piping ends");
            let fault = Fault::new(FaultCode::WrongEnd, format!("drains[{drain}].from"), message);
            faults.push(fault.of(drain_id).help("name the joint at its lower end as the sewer connection"));
        }
        if let Some(vent) = vents.leaving[sewer as usize] {
            let drawn = vents.drawn[vent as usize];
            let vent_id = &self.layout.vents[drawn as usize].id;
            let message = format!("the vent `{vent_id}` leaves the sewer connection `{id}`");
            let fault = Fault::new(FaultCode::WrongEnd, format!("vents[{drawn}].from"), message);
            faults.push(fault.of(vent_id).help("let it leave a joint upstream of the connection"));
        }
    }

    /// Drains that carry nothing, vents that begin nowhere, cleanouts at no joint.
    pub(super) fn check_loose_ends(
        &self,
        ends: &Ends,
        vent_ends: &VentEnds,
        drains: &DrainOrder,
        vents: &VentOrder,
        faults: &mut Faults,
    ) {
        let layout = self.layout;
        let mut met = vec![false; layout.joints.len()];
        ends.to.iter().flatten().for_each(|joint| met[*joint as usize] = true);
        let mut reachable = vec![false; layout.joints.len()];
        for cleanout in layout.cleanouts.iter().enumerate() {
            let (index, cleanout) = cleanout;
            if let Some(joint) = self.joint(&cleanout.at, &format!("cleanouts[{index}].at"), &cleanout.id, faults) {
                reachable[joint as usize] = true;
            }
        }
        for (index, from) in ends.from.iter().enumerate() {
            if let Some(Element::Joint(joint)) = from
                && !met[*joint as usize]
                && !reachable[*joint as usize]
                && vents.leaving[*joint as usize].is_none()
            {
                let drain = &layout.drains[index];
                let message =
                    format!("the drain `{}` begins at `{}`, where nothing drains into it", drain.id, drain.from);
                let fault = Fault::new(FaultCode::DeadEnd, format!("drains[{index}].from"), message);
                faults.push(
                    fault.of(&drain.id).help("connect a fixture, a cleanout or a vent there, or take the drain out"),
                );
            }
        }
        for to in vent_ends.to.iter().flatten() {
            if let Element::Joint(joint) = to {
                met[*joint as usize] = true;
            }
        }
        for (index, from) in vent_ends.from.iter().enumerate() {
            if let Some(joint) = from
                && !met[*joint as usize]
                && drains.leaving[*joint as usize].is_none()
            {
                let vent = &layout.vents[index];
                let message = format!("the vent `{}` begins at `{}`, where no pipe meets it", vent.id, vent.from);
                let fault = Fault::new(FaultCode::WrongEnd, format!("vents[{index}].from"), message);
                faults.push(fault.of(&vent.id).help("let it begin at a joint on a drain or where other vents meet"));
            }
        }
    }
}
