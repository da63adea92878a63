//! A code edition, read from data: tables, parameters and clause numbers, each with its source and how sure it is.
//!
//! ```
//! use dwv_core::edition::Edition;
//! use dwv_core::quantity::PipeSize;
//!
//! let edition = Edition::builtin("npc-2015")?;
//! let vent = edition.vent_by_trap.vent_for(PipeSize::Two).unwrap();
//! assert_eq!(vent.size, PipeSize::OneAndHalf);
//! assert_eq!(edition.citation(vent.citation).clause, "Table 2.5.7.1.");
//! # Ok::<(), dwv_core::Error>(())
//! ```

mod citation;
mod fixture_table;
mod load_tables;
mod provenance;
mod question;
mod reader;
mod readings;
mod rules;
mod trap_arm;
mod vent_by_load;
mod vent_tables;
mod witness;

pub use citation::{Citation, CitationId, Cited, Limit, Source, SourceId, TableSize};
pub use fixture_table::{BathroomGroup, FixtureClass, FixtureKind, FixtureKindId, FixtureTable, LoadForTrap};
pub use load_tables::{BranchTable, BuildingDrainTable, LoadByTrap, SemiContinuousTable, StackTable};
pub use question::{Answer, DrainRole, Question};
pub use readings::{BuildingDrainEnd, Readings, UndergroundDrain, VentLengthReading};
pub use rules::{ArmLimits, FloorDrainExemption, Frost, RuleText, Rules, SiphonicArmLimits, SizeFrom, SlopeFrom};
pub use trap_arm::{TrapArmRow, TrapArmTable};
pub use vent_by_load::{StackVentTable, VentLengthTable};
pub use vent_tables::{VentByTrapTable, WetVentTable};
pub use witness::Witness;

use std::sync::{Arc, OnceLock};

use crate::error::{Error, ErrorKind, Fault, FaultCode, nearest};
use crate::quantity::{PipeSize, PipeSizes, Slope};

/// A code edition: an immutable value.
#[derive(Debug, Clone)]
pub struct Edition {
    /// Its id, such as `npc-2015`.
    pub id: String,
    /// Its title in full.
    pub title: String,
    /// Its title in short, as it stands before clause numbers.
    pub short: String,
    /// The published sources of its values.
    pub sources: Vec<Source>,
    /// The citations that values point to.
    pub citations: Vec<Citation>,
    /// The pipe sizes that an answer may take.
    pub pipe_sizes: PipeSizes,
    /// Which reading of a disputed clause is in force.
    pub readings: Readings,
    /// Fixtures with their outlets and loads.
    pub fixtures: FixtureTable,
    /// What a whole bathroom counts.
    pub bathroom_groups: Vec<BathroomGroup>,
    /// Loads of fixtures that are not listed.
    pub unlisted: LoadByTrap,
    /// Loads of semi-continuous flows.
    pub semi_continuous: SemiContinuousTable,
    /// Stacks.
    pub stack: StackTable,
    /// Branches.
    pub branch: BranchTable,
    /// Building drains and sewers.
    pub building_drain: BuildingDrainTable,
    /// Trap arms.
    pub trap_arm: TrapArmTable,
    /// Vents by the largest trap.
    pub vent_by_trap: VentByTrapTable,
    /// Wet vents.
    pub wet_vent: WetVentTable,
    /// Stack vents and vent stacks.
    pub stack_vent: StackVentTable,
    /// Branch vents, headers and continuous vents.
    pub vent_length: VentLengthTable,
    /// Rules with their parameters.
    pub rules: Rules,
    /// Questions that its sources leave open, with the reading taken.
    pub open_questions: Vec<String>,
    /// The witness of each citation, close together for the passes.
    witnesses: Vec<Witness>,
}

/// The editions that come with the engine.
const BUILTIN: [(&str, &str); 1] = [("npc-2015", include_str!("../../editions/npc-2015.toml"))];

impl Edition {
    /// The ids of the editions that come with the engine.
    #[must_use]
    pub fn builtin_ids() -> Vec<&'static str> {
        BUILTIN.iter().map(|(id, _)| *id).collect()
    }

    /// An edition that comes with the engine; read once in a process.
    ///
    /// # Errors
    /// An id that is not among [`Edition::builtin_ids`].
    pub fn builtin(id: &str) -> Result<Arc<Self>, Error> {
        static READ: OnceLock<Vec<Result<Arc<Edition>, Error>>> = OnceLock::new();
        let Some(index) = BUILTIN.iter().position(|(known, _)| *known == id) else {
            return Err(unknown_edition(id));
        };
        let read = READ.get_or_init(|| BUILTIN.iter().map(|(_, text)| Self::from_toml(text).map(Arc::new)).collect());
        read[index].clone()
    }

    /// Where a value comes from.
    #[must_use]
    pub fn citation(&self, id: CitationId) -> &Citation {
        &self.citations[id.index()]
    }

    /// How sure a value is.
    #[must_use]
    pub fn witness(&self, id: CitationId) -> Witness {
        self.witnesses[id.index()]
    }

    /// The least slope of a drain of a size: by rule up to 6 in, beyond it the flattest that the load table has.
    #[must_use]
    pub fn least_slope(&self, size: PipeSize) -> Cited<Slope> {
        let (small, large) = (self.rules.least_slope_small, self.rules.least_slope_large);
        if size <= small.value.size {
            return Cited { value: small.value.slope, citation: small.citation };
        }
        if size > PipeSize::Six
            && let Some(flattest) = self.building_drain.flattest(size)
        {
            return flattest;
        }
        Cited { value: large.value.slope, citation: large.citation }
    }
}

fn unknown_edition(id: &str) -> Error {
    let message = format!("no edition has the id `{id}`");
    let fault = Fault::new(FaultCode::UnknownId, "edition", message);
    let known = Edition::builtin_ids();
    let fault = match nearest(id, known.iter().copied()) {
        Some(near) => fault.help(format!("did you mean `{near}`?")),
        None => fault.help(format!("known editions: {}", known.join(", "))),
    };
    Error::one(ErrorKind::Edition, fault)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn the_builtin_editions_can_be_read() {
        for id in Edition::builtin_ids() {
            assert_eq!(Edition::builtin(id).unwrap().id, id);
        }
    }

    #[test]
    fn an_unknown_edition_is_named_with_the_nearest() {
        let error = Edition::builtin("npc-2051").unwrap_err();
        assert!(error.to_string().contains("did you mean `npc-2015`?"));
    }

    #[test]
    fn least_slopes_follow_size() {
        let edition = Edition::builtin("npc-2015").unwrap();
        assert_eq!(edition.least_slope(PipeSize::Three).value, Slope::one_in(50));
        assert_eq!(edition.least_slope(PipeSize::Six).value, Slope::one_in(100));
        assert_eq!(edition.least_slope(PipeSize::Twelve).value, Slope::one_in(400));
    }
}
