//! The way of a layout through the engine.

use std::sync::Arc;

use crate::checking::Findings;
use crate::edition::Edition;
use crate::error::Error;
use crate::grading::Grades;
use crate::layout::Layout;
use crate::loading::{Loads, StackLoads, VentLoads, WetLoads};
use crate::naming::Names;
use crate::network::Network;
use crate::sizing::{Operands, Sizes};

/// What to do with a size that rests on a value which nobody here has seen in print.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Default)]
pub enum Unattested {
    /// Give the size and say so.
    #[default]
    Tell,
    /// Give no size: `cannot decide`.
    Refuse,
}

impl Unattested {
    /// Reads `tell` or `refuse`.
    ///
    /// # Errors
    /// Any other word.
    pub fn parse(word: &str) -> Result<Self, Error> {
        match word {
            "tell" => Ok(Self::Tell),
            "refuse" => Ok(Self::Refuse),
            _ => {
                let message = format!("`{word}` says nothing about unattested values, expected `tell` or `refuse`");
                let fault = crate::Fault::new(crate::FaultCode::UnknownWord, "unattested", message);
                Err(Error::one(crate::ErrorKind::Question, fault))
            }
        }
    }
}

/// Every column that the passes make. It keeps its memory, so that sizing again allocates nothing.
#[derive(Debug, Clone, Default)]
pub struct Columns {
    /// What drains through each drain.
    pub loads: Loads,
    /// What each pipe is called and how each trap gets its air.
    pub names: Names,
    /// What enters each stack on one storey.
    pub stack_loads: StackLoads,
    /// What each wet vent serves.
    pub wet_loads: WetLoads,
    /// What each vent serves, and how long its way is.
    pub vent_loads: VentLoads,
    /// Every size with its reasons.
    pub sizes: Sizes,
    /// Every slope, fall and invert.
    pub grades: Grades,
    /// What breaks the code, and what cannot be decided.
    pub findings: Findings,
}

impl Columns {
    /// All passes, one after the other.
    pub fn run(&mut self, network: &Network, edition: &Edition) {
        self.loads.collect(network, edition);
        self.names.find(network, edition, &self.loads);
        self.stack_loads.collect(network, &self.names, &self.loads);
        self.wet_loads.collect(network, &self.names, &self.loads);
        self.vent_loads.collect(network, &self.names, &self.loads);
        let operands = Operands {
            network,
            edition,
            names: &self.names,
            loads: &self.loads,
            stack_loads: &self.stack_loads,
            vent_loads: &self.vent_loads,
            wet_loads: &self.wet_loads,
        };
        self.sizes.find(&operands);
        self.grades.find(&operands, &self.sizes);
        self.findings.find(&operands, &self.sizes, &self.grades);
    }
}

/// A sized drawing: the answer, and everything that it was taken from.
#[derive(Debug, Clone)]
pub struct Sizing {
    /// The edition in force.
    pub edition: Arc<Edition>,
    /// The drawing.
    pub network: Network,
    /// The answer.
    pub columns: Columns,
    /// What is done with unattested values.
    pub unattested: Unattested,
}

impl Sizing {
    /// Sizes a layout by an edition.
    ///
    /// # Errors
    /// All faults of the drawing, as [`Network::new`] finds them.
    pub fn of(layout: &Layout, edition: Arc<Edition>, unattested: Unattested) -> Result<Self, Error> {
        let network = Network::new(layout, &edition)?;
        let mut columns = Columns::default();
        columns.run(&network, &edition);
        Ok(Self { edition, network, columns, unattested })
    }

    /// Sizes a layout by the edition that it names, telling of unattested values.
    ///
    /// # Errors
    /// As [`Sizing::of`], or an edition that is not known.
    pub fn of_layout(layout: &Layout) -> Result<Self, Error> {
        Self::of(layout, Edition::builtin(&layout.edition)?, Unattested::Tell)
    }
}
