//! The ids of a drawing: each is used once.

use std::collections::HashMap;
use std::collections::hash_map::Entry;

use crate::error::{Fault, FaultCode, Faults, nearest};
use crate::layout::{Layout, limits};

/// What an id stands for, with its position in its list.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub(super) enum Element {
    Fixture(u32),
    Joint(u32),
    Drain(u32),
    Vent(u32),
    Terminal(u32),
    Valve(u32),
    Cleanout(u32),
}

impl Element {
    pub(super) fn path(self) -> String {
        match self {
            Self::Fixture(index) => format!("fixtures[{index}]"),
            Self::Joint(index) => format!("joints[{index}]"),
            Self::Drain(index) => format!("drains[{index}]"),
            Self::Vent(index) => format!("vents[{index}]"),
            Self::Terminal(index) => format!("terminals[{index}]"),
            Self::Valve(index) => format!("valves[{index}]"),
            Self::Cleanout(index) => format!("cleanouts[{index}]"),
        }
    }

    pub(super) fn word(self) -> &'static str {
        match self {
            Self::Fixture(_) => "fixture",
            Self::Joint(_) => "joint",
            Self::Drain(_) => "drain",
            Self::Vent(_) => "vent",
            Self::Terminal(_) => "terminal",
            Self::Valve(_) => "valve",
            Self::Cleanout(_) => "cleanout",
        }
    }
}

/// All ids of a layout but those of its levels.
pub(super) struct Register<'a> {
    elements: HashMap<&'a str, Element>,
}

impl<'a> Register<'a> {
    /// Takes every id, reporting empty, overlong and repeated ones.
    pub(super) fn new(layout: &'a Layout, faults: &mut Faults) -> Self {
        let count = layout.fixtures.len() + layout.joints.len() + layout.drains.len() + layout.vents.len();
        let mut register = Self { elements: HashMap::with_capacity(count + layout.terminals.len() + 8) };
        let mut take = |id: &'a str, element: Element| register.take(id, element, faults);
        let number = |index: usize| u32::try_from(index).unwrap_or(u32::MAX);
        layout.fixtures.iter().enumerate().for_each(|(at, it)| take(&it.id, Element::Fixture(number(at))));
        layout.joints.iter().enumerate().for_each(|(at, it)| take(&it.id, Element::Joint(number(at))));
        layout.drains.iter().enumerate().for_each(|(at, it)| take(&it.id, Element::Drain(number(at))));
        layout.vents.iter().enumerate().for_each(|(at, it)| take(&it.id, Element::Vent(number(at))));
        layout.terminals.iter().enumerate().for_each(|(at, it)| take(&it.id, Element::Terminal(number(at))));
        layout.valves.iter().enumerate().for_each(|(at, it)| take(&it.id, Element::Valve(number(at))));
        layout.cleanouts.iter().enumerate().for_each(|(at, it)| take(&it.id, Element::Cleanout(number(at))));
        register
    }

    fn take(&mut self, id: &'a str, element: Element, faults: &mut Faults) {
        check_id(id, &element.path(), faults);
        match self.elements.entry(id) {
            Entry::Vacant(entry) => {
                entry.insert(element);
            }
            Entry::Occupied(entry) => {
                let path = format!("{}.id", element.path());
                let message = format!("the id `{id}` is already that of {}", entry.get().path());
                let help = "give each fixture, joint, pipe, terminal, valve and cleanout an id of its own";
                faults.push(Fault::new(FaultCode::DuplicateId, path, message).of(id).help(help));
            }
        }
    }

    pub(super) fn get(&self, id: &str) -> Option<Element> {
        self.elements.get(id).copied()
    }

    /// The fault for an end that is not there, or that is no place for this pipe.
    pub(super) fn wrong_end(&self, id: &str, path: String, owner: &str, expected: &[&str]) -> Fault {
        let wanted = expected.join(" or ");
        if let Some(element) = self.get(id) {
            let message = format!("`{id}` is a {}, expected a {wanted}", element.word());
            return Fault::new(FaultCode::WrongEnd, path, message).of(owner);
        }
        let candidates =
            self.elements.iter().filter(|(_, element)| expected.contains(&element.word())).map(|(id, _)| *id);
        let fault = Fault::new(FaultCode::UnknownId, path, format!("no {wanted} has the id `{id}`")).of(owner);
        match nearest(id, candidates.take(100_000)) {
            Some(near) => fault.help(format!("did you mean `{near}`?")),
            None => fault.help(format!("add the {wanted} `{id}`, or correct the id")),
        }
    }
}

/// Reports an id that is empty, too long or holds control characters.
pub(super) fn check_id(id: &str, owner: &str, faults: &mut Faults) {
    let fault = if id.trim().is_empty() {
        "an id is empty, expected short text such as `KS`".to_owned()
    } else if id.len() > limits::LONGEST_ID {
        let start: String = id.chars().take(20).collect();
        format!("the id `{start}…` has {} bytes, expected at most {}", id.len(), limits::LONGEST_ID)
    } else if id.chars().any(char::is_control) {
        format!("the id {id:?} holds a control character")
    } else {
        return;
    };
    faults.push(Fault::new(FaultCode::BadId, format!("{owner}.id"), fault));
}
