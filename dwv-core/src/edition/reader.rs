//! An edition read from TOML and checked: every value has a citation, every source is known, every table is in order.

mod cite;
mod raw;
mod rule_reader;

use self::cite::Cites;
use self::raw::{Cell, RawEdition, RawKind, RawTable, RawVentTable};
use super::vent_by_load::LengthRow;
use super::vent_tables::WetVentRow;
use super::{
    BathroomGroup, BranchTable, BuildingDrainTable, CitationId, Cited, Edition, FixtureKind, FixtureTable, Limit,
    LoadByTrap, LoadForTrap, Readings, SemiContinuousTable, Source, StackTable, StackVentTable, TableSize, TrapArmRow,
    TrapArmTable, VentByTrapTable, VentLengthTable, WetVentTable,
};
use crate::error::{Error, ErrorKind, Fault, FaultCode, Faults};
use crate::quantity::{FixtureUnits, Length, LengthUnit, PipeSize};

impl Edition {
    /// Reads an edition from its data.
    ///
    /// # Errors
    /// A text that is no TOML or has unknown keys, with line and column; unknown sources, rules that are missing, tables that
    /// are not in order, all together.
    pub fn from_toml(text: &str) -> Result<Self, Error> {
        let raw: RawEdition = toml::from_str(text).map_err(|error| {
            let fault = Fault::new(FaultCode::WrongFormat, "", format!("the edition cannot be read: {error}"));
            Error::one(ErrorKind::Edition, fault)
        })?;
        let mut faults = Faults::default();
        match build(raw, &mut faults) {
            Some(edition) => faults.into_result(ErrorKind::Edition, edition),
            // A rule is missing or cannot be read, which is among the faults.
            None => Err(faults.into_error(ErrorKind::Edition)),
        }
    }
}

fn build(raw: RawEdition, faults: &mut Faults) -> Option<Edition> {
    let sources: Vec<Source> =
        raw.source.into_iter().map(|source| Source { key: source.key, title: source.title, url: source.url }).collect();
    let mut cites = Cites::new(&sources);
    let rules = rule_reader::read(raw.rules, &mut cites, faults);
    let readings = Readings {
        building_drain_end: cites.reading("building_drain_end", raw.readings.building_drain_end, faults),
        building_drain_underground: cites.reading(
            "building_drain_underground",
            raw.readings.building_drain_underground,
            faults,
        ),
        vent_length: cites.reading("vent_length", raw.readings.vent_length, faults),
    };
    let trap_rule = rules.as_ref().map_or_else(CitationId::default, |rules| rules.trap_is_outlet.citation);
    let fixtures = fixtures(&raw.fixtures, trap_rule, &mut cites, faults);
    let bathroom_groups = raw
        .bathroom_group
        .rows
        .iter()
        .map(|row| {
            let kind = if row.flush_valve { "direct flush valve" } else { "flush tank" };
            let citation =
                cites.row(&raw.bathroom_group, row.witness, None, &format!("bathroom group, {kind}"), faults);
            BathroomGroup { flush_valve: row.flush_valve, load: Cited { value: row.load, citation } }
        })
        .collect();
    let unlisted = LoadByTrap {
        rows: sized(
            &raw.unlisted,
            "fixture not listed, trap",
            |row| (row.trap, row.load, row.witness),
            &mut cites,
            faults,
        ),
    };
    let semi_continuous = SemiContinuousTable {
        rows: raw
            .semi_continuous
            .rows
            .iter()
            .map(|row| {
                let subject = format!("semi-continuous flow, trap {} in, up to {}", row.trap, row.flow);
                let citation = cites.row(&raw.semi_continuous, row.witness, None, &subject, faults);
                (row.trap, row.flow.value, Cited { value: row.load, citation })
            })
            .collect(),
    };
    let stack = StackTable {
        rows: raw
            .stack
            .rows
            .iter()
            .map(|row| {
                let subject = format!("stack, {} in", row.size);
                let total = cites.row(&raw.stack, row.witness, None, &subject, faults);
                let subject = format!("stack, {} in, one storey", row.size);
                let witness = row.one_storey_witness.unwrap_or(row.witness);
                let one = cites.row(&raw.stack, witness, row.note.as_deref(), &subject, faults);
                (row.size, Cited { value: row.total, citation: total }, Cited { value: row.one_storey, citation: one })
            })
            .collect(),
    };
    check_order("stack", stack.rows.iter().map(|(size, total, _)| (*size, total.value)), faults);
    let branch =
        BranchTable { rows: sized(&raw.branch, "branch", |row| (row.size, row.load, row.witness), &mut cites, faults) };
    check_order("branch", branch.rows.iter().map(|(size, load)| (*size, load.value)), faults);
    let building_drain = building_drain(&raw.building_drain, &mut cites, faults);
    let trap_arm = TrapArmTable {
        rows: raw
            .trap_arm
            .rows
            .iter()
            .map(|row| {
                let subject = format!("trap arm, {} in, length", row.size);
                let longest_citation = cites.row(&raw.trap_arm, row.witness, None, &subject, faults);
                let subject = format!("trap arm, {} in, slope", row.size);
                let slope_citation =
                    cites.row(&raw.trap_arm, row.slope_witness.unwrap_or(row.witness), None, &subject, faults);
                TrapArmRow {
                    size: row.size,
                    longest: row.longest.value,
                    longest_citation,
                    least_slope: row.slope.value,
                    slope_citation,
                }
            })
            .collect(),
    };
    let vent_by_trap = VentByTrapTable {
        rows: raw
            .vent_by_trap
            .rows
            .iter()
            .map(|row| {
                let citation =
                    cites.row(&raw.vent_by_trap, row.witness, None, &format!("vent of a {} in trap", row.trap), faults);
                (row.trap, TableSize { size: row.vent, citation })
            })
            .collect(),
    };
    let wet_vent = wet_vent(&raw.wet_vent, &mut cites, faults);
    let stack_vent = StackVentTable {
        vents: raw.stack_vent.vents.clone(),
        rows: raw
            .stack_vent
            .rows
            .iter()
            .map(|row| {
                let stack = row.stack.unwrap_or(PipeSize::Fifteen);
                let subject = format!("vent of a {stack} in stack, up to {} FU", row.load);
                (stack, length_row(&raw.stack_vent, row, &subject, &mut cites, faults))
            })
            .collect(),
    };
    let vent_length = VentLengthTable {
        vents: raw.vent_length.vents.clone(),
        rows: raw
            .vent_length
            .rows
            .iter()
            .map(|row| {
                let subject = format!("vent by load and length, up to {} FU", row.load);
                length_row(&raw.vent_length, row, &subject, &mut cites, faults)
            })
            .collect(),
    };
    Some(Edition {
        id: raw.id,
        title: raw.title,
        short: raw.short,
        witnesses: cites.witnesses(),
        citations: cites.list(),
        sources,
        pipe_sizes: raw.pipe_sizes.into_iter().collect(),
        readings,
        fixtures,
        bathroom_groups,
        unlisted,
        semi_continuous,
        stack,
        branch,
        building_drain,
        trap_arm,
        vent_by_trap,
        wet_vent,
        stack_vent,
        vent_length,
        rules: rules?,
        open_questions: raw.open_questions,
    })
}

/// A table of a size and a load in each row.
fn sized<R>(
    table: &RawTable<R>,
    what: &str,
    row: impl Fn(&R) -> (PipeSize, FixtureUnits, super::Witness),
    cites: &mut Cites,
    faults: &mut Faults,
) -> Vec<(PipeSize, Cited<FixtureUnits>)> {
    let mut rows = Vec::with_capacity(table.rows.len());
    for raw in &table.rows {
        let (size, value, witness) = row(raw);
        let citation = cites.row(table, witness, None, &format!("{what}, {size} in"), faults);
        rows.push((size, Cited { value, citation }));
    }
    rows
}

fn fixtures(table: &RawTable<RawKind>, trap_rule: CitationId, cites: &mut Cites, faults: &mut Faults) -> FixtureTable {
    let mut rows: Vec<FixtureKind> = Vec::with_capacity(table.rows.len());
    for kind in &table.rows {
        if rows.iter().any(|row| row.key == kind.key) {
            let message = format!("the kind `{}` stands twice", kind.key);
            faults.push(Fault::new(FaultCode::DuplicateId, "fixtures", message));
        }
        let outlet = cites.row(table, kind.outlet_witness, None, &format!("{}, outlet", kind.words), faults);
        let mut loads = Vec::new();
        if let Some(load) = kind.load {
            let witness = kind.witness.unwrap_or(super::Witness::Unsure);
            let citation = cites.row(table, witness, kind.note.as_deref(), &format!("{}, load", kind.words), faults);
            loads.push(LoadForTrap { trap: None, load: Cited { value: load, citation } });
        }
        for row in &kind.loads {
            let subject = format!("{}, load with a {} in trap", kind.words, row.trap);
            let citation = cites.row(table, row.witness, kind.note.as_deref(), &subject, faults);
            loads.push(LoadForTrap { trap: Some(row.trap), load: Cited { value: row.load, citation } });
        }
        if loads.is_empty() {
            let message = format!("the kind `{}` has no load", kind.key);
            faults.push(Fault::new(FaultCode::MissingKey, "fixtures", message));
        }
        let trap = match kind.trap {
            Some(size) => Cited { value: size, citation: outlet },
            None => Cited { value: kind.outlet, citation: trap_rule },
        };
        rows.push(FixtureKind {
            key: kind.key.clone(),
            words: kind.words.clone(),
            class: kind.class,
            siphonic: kind.siphonic,
            flush_valve: kind.flush_valve,
            outlet: Cited { value: kind.outlet, citation: outlet },
            trap,
            loads,
        });
    }
    FixtureTable { rows }
}

fn building_drain(table: &raw::RawBuildingDrain, cites: &mut Cites, faults: &mut Faults) -> BuildingDrainTable {
    let slopes = table.slopes.iter().map(|slope| slope.value).collect::<Vec<_>>();
    let mut rows = Vec::with_capacity(table.rows.len());
    for row in &table.rows {
        if row.loads.len() != slopes.len() {
            let message =
                format!("the row of {} in has {} loads for {} slopes", row.size, row.loads.len(), slopes.len());
            faults.push(Fault::new(FaultCode::WrongFormat, "building_drain", message));
            continue;
        }
        let mut loads = Vec::with_capacity(slopes.len());
        for (cell, slope) in row.loads.iter().zip(&table.slopes) {
            let subject = format!("building drain, {} in at {slope}", row.size);
            loads.push(match cell {
                Cell::Number(load) => {
                    let note = table.note.as_deref();
                    let citation = cites.cell(&table.clause, row.witness, &table.sources, &subject, note, faults);
                    load_of(*load, &subject, faults).map(|value| Cited { value, citation })
                }
                Cell::Word(_) => None,
            });
        }
        rows.push((row.size, loads));
    }
    BuildingDrainTable { slopes, rows }
}

fn wet_vent(table: &RawTable<raw::RawWetVent>, cites: &mut Cites, faults: &mut Faults) -> WetVentTable {
    let rows = table.rows.iter().map(|row| {
        let mut limit = |cell: &Cell, what: &str| {
            let subject = format!("wet vent, {} in, {what} water closets", row.size);
            let citation = cites.row(table, row.witness, None, &subject, faults);
            let limit = match cell {
                Cell::Number(load) => load_of(*load, &subject, faults).map_or(Limit::NotKnown, Limit::Most),
                Cell::Word(word) => word.limit(),
            };
            (limit, citation)
        };
        let (without, without_citation) = limit(&row.without, "without");
        let (with, with_citation) = limit(&row.with, "with");
        WetVentRow { size: row.size, without, without_citation, with, with_citation }
    });
    WetVentTable { rows: rows.collect() }
}

fn load_of(load: f64, subject: &str, faults: &mut Faults) -> Option<FixtureUnits> {
    FixtureUnits::from_number(load)
        .map_err(|error| faults.push(Fault::new(FaultCode::WrongQuantity, subject, error.to_string())))
        .ok()
}

fn length_row(
    table: &RawVentTable,
    row: &raw::RawLengthRow,
    subject: &str,
    cites: &mut Cites,
    faults: &mut Faults,
) -> LengthRow {
    let note = table.note.as_deref();
    let citation = cites.cell(&table.clause, row.witness, &table.sources, subject, note, faults);
    // Blank cells to the right of the last length: the table prints no limit there.
    let mut longest: Vec<Limit<Length>> = Vec::with_capacity(table.vents.len());
    for cell in &row.longest {
        longest.push(match cell {
            Cell::Number(metres) => match Length::from_number(*metres, LengthUnit::Metre) {
                Ok(length) => Limit::Most(length),
                Err(error) => {
                    faults.push(Fault::new(FaultCode::WrongQuantity, subject, error.to_string()));
                    Limit::NotKnown
                }
            },
            Cell::Word(word) => word.limit(),
        });
    }
    if longest.len() > table.vents.len() {
        let message = format!("{} cells for {} vent sizes", longest.len(), table.vents.len());
        faults.push(Fault::new(FaultCode::WrongFormat, subject, message));
    }
    longest.resize(table.vents.len(), Limit::NotLimited);
    LengthRow { load: row.load, longest, citation }
}

/// Sizes and loads must grow from row to row.
fn check_order(table: &str, rows: impl Iterator<Item = (PipeSize, FixtureUnits)>, faults: &mut Faults) {
    let mut before: Option<(PipeSize, FixtureUnits)> = None;
    for (size, load) in rows {
        if before.is_some_and(|(smaller, less)| smaller >= size || less > load) {
            let message = format!("the row of {size} in does not follow in order");
            faults.push(Fault::new(FaultCode::WrongFormat, table, message));
        }
        before = Some((size, load));
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    const DATA: &str = include_str!("../../editions/npc-2015.toml");

    fn message(from: &str, to: &str) -> String {
        assert!(DATA.contains(from), "`{from}` is in the data");
        Edition::from_toml(&DATA.replacen(from, to, 1)).unwrap_err().to_string()
    }

    #[test]
    fn faults_in_the_data_are_named() {
        assert!(message("short = \"NPC 2015\"", "shorter = \"NPC 2015\"").contains("shorter"));
        assert!(message("{ size = \"3\", load = 27,", "{ size = \"3\", load = 2,").contains("branch: the row of 3 in"));
        assert!(message("[rules.water_closet_least]", "[rules.water_closet_most]").contains("water_closet_least"));
        assert!(message("\"tru16\", \"tru18\"", "\"tru61\", \"tru18\"").contains("tru61"));
        assert!(Edition::from_toml("id = ").is_err());
        assert!(Edition::from_toml("").is_err());
    }

    #[test]
    fn several_faults_are_reported_together() {
        let data = DATA.replacen("{ size = \"3\", load = 27,", "{ size = \"3\", load = 2,", 1).replacen(
            "[rules.water_closet_least]",
            "[rules.water_closet_most]",
            1,
        );
        assert!(Edition::from_toml(&data).unwrap_err().total() >= 3);
    }

    #[test]
    fn every_source_is_used() {
        let edition = Edition::from_toml(DATA).unwrap();
        let mut used = vec![false; edition.sources.len()];
        for citation in &edition.citations {
            citation.sources.iter().for_each(|source| used[source.index()] = true);
        }
        let unused: Vec<_> =
            edition.sources.iter().zip(used).filter(|(_, used)| !used).map(|(source, _)| &source.key).collect();
        assert!(unused.is_empty(), "{unused:?}");
    }
}
