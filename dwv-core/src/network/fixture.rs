//! The trap and the load of a drawn fixture, by the edition's tables or as stated.

use crate::edition::{Cited, Edition, FixtureClass, FixtureKindId};
use crate::error::{Fault, FaultCode, Faults, nearest};
use crate::layout::{Fixture, limits};
use crate::quantity::{FixtureUnits, FlowRate, PipeSize};

/// Where the size of a trap comes from.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum TrapSource {
    /// The drawing states it.
    Stated,
    /// The fixture table, or the outlet size that it lists.
    Table,
}

/// Where a load comes from.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum LoadSource {
    /// The drawing states it.
    Stated,
    /// The fixture table.
    Table,
    /// The table of loads by trap size, for fixtures that are not listed.
    TrapSize,
    /// The continuous flow that is stated.
    ContinuousFlow,
    /// The table of semi-continuous flows.
    SemiContinuousFlow,
}

/// What the network keeps of a fixture.
pub(super) struct Demand {
    pub(super) kind: Option<FixtureKindId>,
    pub(super) class: FixtureClass,
    pub(super) trap: Cited<PipeSize>,
    pub(super) trap_source: TrapSource,
    pub(super) outlet: Option<Cited<PipeSize>>,
    pub(super) load: Cited<FixtureUnits>,
    pub(super) load_source: LoadSource,
}

/// The word that stands for a fixture outside the edition's table.
const CUSTOM: &str = "custom";

/// Looks a fixture up; reports a kind that is not listed and a custom fixture that says too little.
pub(super) fn demand(edition: &Edition, fixture: &Fixture, path: &str, faults: &mut Faults) -> Option<Demand> {
    if let Some(load) = fixture.load
        && load.thousandths() > limits::MOST_LOAD_THOUSANDTHS
    {
        let message =
            format!("a load of `{load}` fixture units is beyond what the engine takes for one fixture, 10000");
        faults.push(Fault::new(FaultCode::OutOfRange, format!("{path}.load"), message).of(&fixture.id));
        return None;
    }
    let kind = match edition.fixtures.kind(&fixture.kind) {
        Some(kind) => Some(kind),
        None if fixture.kind == CUSTOM => None,
        None => {
            faults.push(unknown_kind(edition, fixture, path));
            return None;
        }
    };
    let listed = kind.map(|kind| edition.fixtures.row(kind));
    let (trap, trap_source) = match (fixture.trap, kind) {
        (Some(size), _) => (Cited { value: size, citation: edition.rules.trap_is_outlet.citation }, TrapSource::Stated),
        (None, Some(kind)) => (edition.fixtures.default_trap(kind), TrapSource::Table),
        (None, None) => {
            let message = "a custom fixture needs the size of its trap".to_owned();
            let fault = Fault::new(FaultCode::FixtureIncomplete, format!("{path}.trap"), message);
            faults.push(fault.of(&fixture.id).help("state `trap`, such as \"1-1/2\""));
            return None;
        }
    };
    let (load, load_source) = load(edition, fixture, kind, trap.value, path, faults)?;
    Some(Demand {
        kind,
        class: listed.map_or(FixtureClass::Other, |listed| listed.class),
        trap,
        trap_source,
        outlet: listed.map(|listed| listed.outlet),
        load,
        load_source,
    })
}

fn unknown_kind(edition: &Edition, fixture: &Fixture, path: &str) -> Fault {
    let message = format!("{} lists no fixture of the kind `{}`", edition.short, fixture.kind);
    let fault = Fault::new(FaultCode::UnknownKind, format!("{path}.kind"), message).of(&fixture.id);
    let kinds = edition.fixtures.rows.iter().map(|row| row.key.as_str()).chain([CUSTOM]);
    match nearest(&fixture.kind, kinds) {
        Some(near) => fault.help(format!("did you mean `{near}`?")),
        None => fault.help("take a kind of the edition's fixture table, or `custom` with `trap` and `load`"),
    }
}

fn load(
    edition: &Edition,
    fixture: &Fixture,
    kind: Option<FixtureKindId>,
    trap: PipeSize,
    path: &str,
    faults: &mut Faults,
) -> Option<(Cited<FixtureUnits>, LoadSource)> {
    let statements = [
        ("load", fixture.load.is_some()),
        ("continuous_flow", fixture.continuous_flow.is_some()),
        ("semi_continuous_flow", fixture.semi_continuous_flow.is_some()),
    ];
    let stated: Vec<&str> = statements.iter().filter(|(_, stated)| *stated).map(|(key, _)| *key).collect();
    if stated.len() > 1 {
        let message = format!("the load is stated twice, by `{}`", stated.join("` and `"));
        let fault = Fault::new(FaultCode::Contradiction, format!("{path}.{}", stated[1]), message);
        faults.push(fault.of(&fixture.id).help("leave one of them out"));
        return None;
    }
    if let Some(load) = fixture.load {
        return Some((Cited { value: load, citation: edition.rules.total_load.citation }, LoadSource::Stated));
    }
    if let Some(flow) = &fixture.continuous_flow {
        let rule = edition.rules.continuous_flow;
        let load = continuous_load(rule.value, flow.value);
        return Some((Cited { value: load, citation: rule.citation }, LoadSource::ContinuousFlow));
    }
    if let Some(flow) = &fixture.semi_continuous_flow {
        let Some(load) = edition.semi_continuous.load(trap, flow.value) else {
            let message = format!("{} gives no load for a semi-continuous flow of `{flow}`", edition.short);
            let fault = Fault::new(FaultCode::FixtureIncomplete, format!("{path}.semi_continuous_flow"), message);
            faults.push(fault.of(&fixture.id).help("state `load`"));
            return None;
        };
        return Some((load, LoadSource::SemiContinuousFlow));
    }
    let listed = kind.and_then(|kind| edition.fixtures.load(kind, Some(trap)));
    if let Some(load) = listed {
        return Some((load, LoadSource::Table));
    }
    let Some(load) = edition.unlisted.load(trap) else {
        let message = format!("{} gives no load for a trap of {trap} in", edition.short);
        let fault = Fault::new(FaultCode::FixtureIncomplete, format!("{path}.trap"), message);
        faults.push(fault.of(&fixture.id).help("state `load`, or correct the trap"));
        return None;
    };
    Some((load, LoadSource::TrapSize))
}

/// The load of a continuous flow: so many fixture units for each litre per second, rounded up to a thousandth.
fn continuous_load(for_each_litre: FixtureUnits, flow: FlowRate) -> FixtureUnits {
    const PICOLITRES_IN_A_LITRE: u128 = 1_000_000_000_000;
    let load = u128::from(for_each_litre.thousandths()) * u128::from(flow.picolitres_per_second());
    FixtureUnits::from_thousandths(u64::try_from(load.div_ceil(PICOLITRES_IN_A_LITRE)).unwrap_or(u64::MAX))
}
