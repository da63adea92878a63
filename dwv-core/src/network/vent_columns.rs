//! The columns of the vents, their terminals and valves.

use std::collections::HashMap;

use super::build::Build;
use super::drain_order::DrainOrder;
use super::geometry::{Place, vent_length};
use super::register::Element;
use super::vent_order::{VentEnds, VentOrder};
use super::{DrainId, TerminalRow, ValveRow, VentId, Vents};
use crate::error::{Fault, FaultCode, Faults};
use crate::layout::limits;
use crate::quantity::Length;

impl Build<'_> {
    pub(super) fn vent_ends(&self, faults: &mut Faults) -> VentEnds {
        let count = self.layout.vents.len();
        let mut ends = VentEnds { from: Vec::with_capacity(count), to: Vec::with_capacity(count) };
        for (index, vent) in self.layout.vents.iter().enumerate() {
            let from = match self.register.get(&vent.from) {
                Some(Element::Joint(joint)) => Some(joint),
                _ => {
                    let path = format!("vents[{index}].from");
                    faults.push(self.register.wrong_end(&vent.from, path, &vent.id, &["joint"]));
                    None
                }
            };
            let to = match self.register.get(&vent.to) {
                found @ Some(Element::Joint(_) | Element::Terminal(_) | Element::Valve(_)) => found,
                _ => {
                    let path = format!("vents[{index}].to");
                    let expected = ["joint", "terminal", "valve"];
                    faults.push(self.register.wrong_end(&vent.to, path, &vent.id, &expected));
                    None
                }
            };
            ends.from.push(from);
            ends.to.push(to);
        }
        ends
    }

    pub(super) fn vents(
        &self,
        ends: &VentEnds,
        order: &VentOrder,
        drains: &DrainOrder,
        faults: &mut Faults,
    ) -> (Vents, Vec<TerminalRow>, Vec<ValveRow>) {
        let layout = self.layout;
        let terminal_place: Vec<Place> = layout
            .terminals
            .iter()
            .enumerate()
            .map(|(index, it)| {
                self.place(it.level.as_ref(), it.height, it.at, &it.id, || format!("terminals[{index}]"), faults)
            })
            .collect();
        let valve_place: Vec<Place> = layout
            .valves
            .iter()
            .enumerate()
            .map(|(index, it)| {
                self.place(it.level.as_ref(), it.height, it.at, &it.id, || format!("valves[{index}]"), faults)
            })
            .collect();
        let lengths: Vec<Option<Length>> = layout
            .vents
            .iter()
            .enumerate()
            .map(|(index, vent)| {
                let from = ends.from[index].map_or(Place::UNKNOWN, |joint| self.joints[joint as usize]);
                let to = match ends.to[index] {
                    Some(Element::Terminal(terminal)) => terminal_place[terminal as usize],
                    Some(Element::Valve(valve)) => valve_place[valve as usize],
                    Some(element) => self.place_of(element),
                    None => Place::UNKNOWN,
                };
                vent_length(vent, &format!("vents[{index}]"), &from, &to, self.reader, faults)
            })
            .collect();
        let each = || order.drawn.iter().map(|drawn| *drawn as usize);
        let vent = |index: usize| &layout.vents[index];
        let drain = |index: usize| {
            let joint = ends.from[index]?;
            drains.leaving[joint as usize].map(|drain| DrainId::new(drain as usize))
        };
        let columns = Vents {
            id: each().map(|index| vent(index).id.clone()).collect(),
            drawn: order.drawn.clone(),
            from: each().map(|index| vent(index).from.clone()).collect(),
            to: each().map(|index| vent(index).to.clone()).collect(),
            next: order.next.iter().map(|next| next.map(|next| VentId::new(next as usize))).collect(),
            first: order.first.clone(),
            end: order.end.clone(),
            drain: each().map(drain).collect(),
            length: each().map(|index| lengths[index]).collect(),
            stated_size: each().map(|index| vent(index).size).collect(),
            stated_name: each().map(|index| vent(index).name).collect(),
        };
        let arriving = self.arriving_vents(ends, order, faults);
        let mut terminals = Vec::new();
        for (index, terminal) in layout.terminals.iter().enumerate() {
            let path = || format!("terminals[{index}].above");
            let above = self.reader.read(terminal.above, &limits::HEIGHT, path, faults);
            if let Some(vent) = arriving.get(&Element::Terminal(index as u32)) {
                terminals.push(TerminalRow { id: terminal.id.clone(), through: terminal.through, above, vent: *vent });
            }
        }
        let mut valves = Vec::new();
        for (index, valve) in layout.valves.iter().enumerate() {
            if let Some(vent) = arriving.get(&Element::Valve(index as u32)) {
                valves.push(ValveRow { id: valve.id.clone(), grounds: valve.grounds, vent: *vent });
            }
        }
        (columns, terminals, valves)
    }

    /// The one vent that ends at each terminal and valve.
    fn arriving_vents(&self, ends: &VentEnds, order: &VentOrder, faults: &mut Faults) -> HashMap<Element, VentId> {
        let layout = self.layout;
        let mut number = vec![None; layout.vents.len()];
        for (index, drawn) in order.drawn.iter().enumerate() {
            number[*drawn as usize] = Some(VentId::new(index));
        }
        let mut arriving = HashMap::new();
        for (index, to) in ends.to.iter().enumerate() {
            let Some(element @ (Element::Terminal(_) | Element::Valve(_))) = to else { continue };
            let Some(vent) = number[index] else { continue };
            if arriving.insert(*element, vent).is_some() {
                let vent = &layout.vents[index];
                let message = format!("more than one vent ends at the {} `{}`", element.word(), vent.to);
                let fault = Fault::new(FaultCode::WrongEnd, format!("vents[{index}].to"), message);
                faults.push(fault.of(&vent.id).help("let the vents meet at a joint and lead one vent on to it"));
            }
        }
        let ids = layout.terminals.iter().enumerate().map(|(index, it)| (Element::Terminal(index as u32), &it.id));
        let ids = ids.chain(layout.valves.iter().enumerate().map(|(index, it)| (Element::Valve(index as u32), &it.id)));
        for (element, id) in ids {
            if !arriving.contains_key(&element) {
                let message = format!("no vent ends at the {} `{id}`", element.word());
                let fault = Fault::new(FaultCode::WrongEnd, element.path(), message);
                faults.push(fault.of(id).help("lead a vent to it, or take it out"));
            }
        }
        arriving
    }
}
