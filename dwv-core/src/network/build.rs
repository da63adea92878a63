//! From a layout to a network, gathering every fault on the way.

use super::drain_order::{self, DrainOrder, Ends};
use super::fixture::{self, Demand};
use super::geometry::{DrainEnds, Place, Reader, Run};
use super::register::{Element, Register, check_id};
use super::vent_order::{self, VentOrder};
use super::{DrainId, Drains, FixtureId, Fixtures, GroupRow, LevelRow, Network, Storey, VentId};
use crate::edition::Edition;
use crate::error::{Error, ErrorKind, Fault, FaultCode, Faults, nearest};
use crate::layout::{Id, Layout, Position, limits};
use crate::quantity::{Elevation, Length, LengthUnit, Measure, PipeSize, PipeSizes};

impl Network {
    /// Makes a network of a drawing.
    ///
    /// # Errors
    /// All faults of the drawing together: unknown and repeated ids, drains that run in a circle or do not reach the
    /// sewer, vents without air, lengths that contradict positions, kinds that the edition does not list.
    pub fn new(layout: &Layout, edition: &Edition) -> Result<Self, Error> {
        check_counts(layout)?;
        let mut faults = Faults::default();
        let network = Build::new(layout, edition, &mut faults).network(&mut faults);
        faults.into_result(ErrorKind::Drawing, network)
    }
}

/// A drawing without levels, fixtures or drains, or with more than the engine takes, is looked at no further.
fn check_counts(layout: &Layout) -> Result<(), Error> {
    let mut faults = Faults::default();
    let counts = [
        ("levels", layout.levels.len(), limits::MOST_LEVELS),
        ("fixtures", layout.fixtures.len(), limits::MOST_ELEMENTS),
        ("joints", layout.joints.len(), limits::MOST_ELEMENTS),
        ("drains", layout.drains.len(), limits::MOST_ELEMENTS),
        ("vents", layout.vents.len(), limits::MOST_ELEMENTS),
    ];
    for (path, count, most) in counts {
        if count > most {
            faults.push(Fault::new(FaultCode::OutOfRange, path, format!("{count} {path}, expected at most {most}")));
        }
    }
    for (path, count) in
        [("levels", layout.levels.len()), ("fixtures", layout.fixtures.len()), ("drains", layout.drains.len())]
    {
        if count == 0 {
            faults.push(Fault::new(FaultCode::MissingKey, path, format!("the layout has no {path}")));
        }
    }
    faults.into_result(ErrorKind::Drawing, ())
}

/// What is worked out of a layout before the columns are filled.
pub(super) struct Build<'a> {
    pub(super) layout: &'a Layout,
    edition: &'a Edition,
    pub(super) register: Register<'a>,
    pub(super) reader: Reader,
    levels: Vec<LevelRow>,
    fixtures: Vec<Place>,
    pub(super) joints: Vec<Place>,
}

impl<'a> Build<'a> {
    fn new(layout: &'a Layout, edition: &'a Edition, faults: &mut Faults) -> Self {
        let reader = Reader { unit: layout.units };
        let levels = levels(layout, reader, faults);
        let mut build = Self {
            layout,
            edition,
            register: Register::new(layout, faults),
            reader,
            levels,
            fixtures: Vec::with_capacity(layout.fixtures.len()),
            joints: Vec::with_capacity(layout.joints.len()),
        };
        for (index, fixture) in layout.fixtures.iter().enumerate() {
            let path = || format!("fixtures[{index}]");
            let place = build.place(Some(&fixture.level), fixture.height, fixture.at, &fixture.id, path, faults);
            build.fixtures.push(place);
        }
        for (index, joint) in layout.joints.iter().enumerate() {
            let path = || format!("joints[{index}]");
            let place = build.place(Some(&joint.level), joint.height, joint.at, &joint.id, path, faults);
            build.joints.push(place);
        }
        build
    }

    pub(super) fn place(
        &self,
        level: Option<&Id>,
        height: Option<Measure>,
        at: Option<Position>,
        owner: &str,
        path: impl Fn() -> String,
        faults: &mut Faults,
    ) -> Place {
        let stated = self.reader.read(height, &limits::HEIGHT, || format!("{}.height", path()), faults);
        let at = self.reader.position(at, &path, faults);
        let Some(level) = level else { return Place { at, ..Place::UNKNOWN } };
        let Some(rank) = self.levels.iter().position(|row| row.id == *level) else {
            let message = format!("no level has the id `{level}`");
            let fault = Fault::new(FaultCode::UnknownId, format!("{}.level", path()), message).of(owner);
            let help = match nearest(level, self.levels.iter().map(|row| row.id.as_str())) {
                Some(near) => format!("did you mean `{near}`?"),
                None => format!("add the level `{level}`, or correct the id"),
            };
            faults.push(fault.help(help));
            return Place { at, ..Place::UNKNOWN };
        };
        let elevation = self.levels[rank].floor + stated.unwrap_or(Length::ZERO);
        let storey = Storey(u8::try_from(rank).unwrap_or(u8::MAX));
        Place { elevation: Some(elevation), height_stated: height.is_some(), at, storey: Some(storey) }
    }

    pub(super) fn place_of(&self, element: Element) -> Place {
        match element {
            Element::Fixture(index) => self.fixtures[index as usize],
            Element::Joint(index) => self.joints[index as usize],
            _ => Place::UNKNOWN,
        }
    }

    fn network(self, faults: &mut Faults) -> Network {
        let layout = self.layout;
        let sewer = self.joint(&layout.sewer.at, "sewer.at", "the sewer connection", faults);
        let ends = self.drain_ends(faults);
        let vent_ends = self.vent_ends(faults);
        let drain_order = drain_order::order(layout, &ends, sewer, faults);
        let vent_order = vent_order::order(layout, &vent_ends, faults);
        self.check_sewer(sewer, &ends, &vent_order, faults);
        self.check_loose_ends(&ends, &vent_ends, &drain_order, &vent_order, faults);

        let runs = self.runs(&ends, faults);
        let (vents, terminals, valves) = self.vents(&vent_ends, &vent_order, &drain_order, faults);
        let demands: Vec<Option<Demand>> = layout
            .fixtures
            .iter()
            .enumerate()
            .map(|(index, fixture)| fixture::demand(self.edition, fixture, &format!("fixtures[{index}]"), faults))
            .collect();
        let mut drains = self.drains(&drain_order, &vent_order, &ends, &runs);
        let (fixtures, groups) = self.fixtures(&mut drains, &drain_order, &ends, demands, faults);
        let building_drain_ends_at = layout.building_drain_ends_at.as_ref().and_then(|id| {
            let joint = self.joint(id, "building_drain_ends_at", "the end of the building drain", faults)?;
            drain_order.leaving[joint as usize].map(|drain| DrainId::new(drain as usize))
        });
        let path = || "sewer.invert".to_owned();
        let invert = self.reader.read(layout.sewer.invert, &limits::ELEVATION, path, faults);
        let pipe_sizes = self.pipe_sizes(faults);
        Network {
            name: layout.name.to_string(),
            drains,
            vents,
            fixtures,
            levels: self.levels,
            terminals,
            valves,
            groups,
            sewer_joint: layout.sewer.at.clone(),
            sewer_invert: invert.map(Elevation),
            building_drain_ends_at,
            frost_can_close_vents: layout.frost_can_close_vents,
            pipe_sizes,
            length_unit: length_unit(layout),
        }
    }

    pub(super) fn joint(&self, id: &str, path: &str, owner: &str, faults: &mut Faults) -> Option<u32> {
        match self.register.get(id) {
            Some(Element::Joint(joint)) => Some(joint),
            _ => {
                faults.push(self.register.wrong_end(id, path.to_owned(), owner, &["joint"]));
                None
            }
        }
    }

    fn drain_ends(&self, faults: &mut Faults) -> Ends {
        let count = self.layout.drains.len();
        let mut ends = Ends { from: Vec::with_capacity(count), to: Vec::with_capacity(count) };
        for (index, drain) in self.layout.drains.iter().enumerate() {
            let from = match self.register.get(&drain.from) {
                found @ Some(Element::Fixture(_) | Element::Joint(_)) => found,
                _ => {
                    let path = format!("drains[{index}].from");
                    faults.push(self.register.wrong_end(&drain.from, path, &drain.id, &["fixture", "joint"]));
                    None
                }
            };
            let to = match self.register.get(&drain.to) {
                Some(Element::Joint(joint)) => Some(joint),
                _ => {
                    let path = format!("drains[{index}].to");
                    faults.push(self.register.wrong_end(&drain.to, path, &drain.id, &["joint"]));
                    None
                }
            };
            ends.from.push(from);
            ends.to.push(to);
        }
        ends
    }

    fn runs(&self, ends: &Ends, faults: &mut Faults) -> Vec<Run> {
        let place = |element: Option<Element>| element.map_or(Place::UNKNOWN, |element| self.place_of(element));
        self.layout
            .drains
            .iter()
            .enumerate()
            .map(|(index, drain)| {
                let to = place(ends.to[index].map(Element::Joint));
                DrainEnds { drain, path: index, from: place(ends.from[index]), to }.run(self.reader, faults)
            })
            .collect()
    }

    fn drains(&self, order: &DrainOrder, vents: &VentOrder, ends: &Ends, runs: &[Run]) -> Drains {
        let each = || order.drawn.iter().map(|drawn| *drawn as usize);
        let layout = self.layout;
        let drain = |index: usize| &layout.drains[index];
        let storey = |index: usize| {
            let place = ends.from[index].map_or(Place::UNKNOWN, |element| self.place_of(element));
            place.storey.unwrap_or(Storey(0))
        };
        let vent = |index: usize| match ends.from[index] {
            Some(Element::Joint(joint)) => vents.leaving[joint as usize].map(|vent| VentId::new(vent as usize)),
            _ => None,
        };
        Drains {
            id: each().map(|index| drain(index).id.clone()).collect(),
            drawn: order.drawn.clone(),
            from: each().map(|index| drain(index).from.clone()).collect(),
            to: each().map(|index| drain(index).to.clone()).collect(),
            next: order.next.iter().map(|next| next.map(|next| DrainId::new(next as usize))).collect(),
            first: order.first.clone(),
            fixture: vec![None; order.drawn.len()],
            vent: each().map(vent).collect(),
            length: each().map(|index| runs[index].length).collect(),
            drop: each().map(|index| runs[index].drop).collect(),
            slope: each().map(|index| runs[index].slope).collect(),
            slope_notation: each().map(|index| drain(index).slope.map(|slope| slope.notation)).collect(),
            vertical: each().map(|index| runs[index].vertical).collect(),
            underground: each().map(|index| drain(index).underground).collect(),
            outside: each().map(|index| drain(index).outside).collect(),
            top: each().map(|index| runs[index].top).collect(),
            foot: each().map(|index| runs[index].foot).collect(),
            storey: each().map(storey).collect(),
            stated_size: each().map(|index| drain(index).size).collect(),
            stated_name: each().map(|index| drain(index).name).collect(),
            turns: each().map(|index| drain(index).turns).collect(),
        }
    }

    fn fixtures(
        &self,
        drains: &mut Drains,
        order: &DrainOrder,
        ends: &Ends,
        mut demands: Vec<Option<Demand>>,
        faults: &mut Faults,
    ) -> (Fixtures, Vec<GroupRow>) {
        let layout = self.layout;
        let mut fixtures = Fixtures::default();
        let mut groups: Vec<(&Id, FixtureId)> = Vec::new();
        let mut drained = vec![false; layout.fixtures.len()];
        ends.from.iter().flatten().for_each(|from| {
            if let Element::Fixture(index) = from {
                drained[*index as usize] = true;
            }
        });
        for (index, fixture) in layout.fixtures.iter().enumerate() {
            if !drained[index] {
                let message = format!("the fixture `{}` does not reach the sewer: no drain leaves it", fixture.id);
                let fault = Fault::new(FaultCode::ReachesNoSewer, format!("fixtures[{index}]"), message);
                faults.push(fault.of(&fixture.id).help("add a drain from it"));
            }
        }
        for (number, drawn) in order.drawn.iter().enumerate() {
            let Some(Element::Fixture(index)) = ends.from[*drawn as usize] else { continue };
            let fixture = &layout.fixtures[index as usize];
            let Some(demand) = demands[index as usize].take() else { continue };
            let id = FixtureId::new(fixtures.len());
            drains.fixture[number] = Some(id);
            if let Some(group) = &fixture.group {
                groups.push((group, id));
            }
            let path = || format!("fixtures[{index}].outlet_length");
            let outlet_length = self.reader.read(fixture.outlet_length, &limits::PIPE_LENGTH, path, faults);
            fixtures.id.push(fixture.id.clone());
            fixtures.drawn.push(index);
            fixtures.kind.push(demand.kind);
            fixtures.class.push(demand.class);
            fixtures.drain.push(DrainId::new(number));
            fixtures.trap.push(demand.trap);
            fixtures.trap_source.push(demand.trap_source);
            fixtures.outlet.push(demand.outlet);
            fixtures.load.push(demand.load);
            fixtures.load_source.push(demand.load_source);
            fixtures.outlet_length.push(outlet_length);
            fixtures.storey.push(self.fixtures[index as usize].storey.unwrap_or(Storey(0)));
            fixtures.future.push(fixture.future);
        }
        groups.sort();
        let mut rows: Vec<GroupRow> = Vec::new();
        for (name, fixture) in groups {
            match rows.last_mut().filter(|row| row.name == *name) {
                Some(row) => row.fixtures.push(fixture),
                None => rows.push(GroupRow { name: name.clone(), fixtures: vec![fixture] }),
            }
        }
        (fixtures, rows)
    }

    /// The sizes that an answer may take: those of the edition, or those at hand.
    fn pipe_sizes(&self, faults: &mut Faults) -> PipeSizes {
        let Some(stated) = &self.layout.pipe_sizes else { return self.edition.pipe_sizes };
        let sizes: PipeSizes = stated.iter().copied().collect();
        if sizes.is_empty() {
            faults.push(
                Fault::new(FaultCode::OutOfRange, "pipe_sizes", "no pipe size is at hand")
                    .help("leave `pipe_sizes` out to take all sizes of the edition"),
            );
        } else if sizes.at_least(PipeSize::Four).is_none() {
            let message = "the sizes at hand end below 4 in, which building sewers need".to_owned();
            faults.push(Fault::new(FaultCode::OutOfRange, "pipe_sizes", message).help("add larger sizes"));
        }
        sizes
    }
}

/// The levels from the lowest up.
fn levels(layout: &Layout, reader: Reader, faults: &mut Faults) -> Vec<LevelRow> {
    let mut rows: Vec<(Length, &Id)> = Vec::with_capacity(layout.levels.len());
    for (index, level) in layout.levels.iter().enumerate() {
        check_id(&level.id, &format!("levels[{index}]"), faults);
        if rows.iter().any(|(_, id)| **id == level.id) {
            let message = format!("the id `{}` is already that of another level", level.id);
            let fault = Fault::new(FaultCode::DuplicateId, format!("levels[{index}].id"), message);
            faults.push(fault.of(&level.id).help("give each level an id of its own"));
            continue;
        }
        let path = || format!("levels[{index}].floor");
        let floor = reader.read(Some(level.floor), &limits::ELEVATION, path, faults).unwrap_or(Length::ZERO);
        rows.push((floor, &level.id));
    }
    rows.sort_unstable();
    rows.into_iter().map(|(floor, id)| LevelRow { id: id.clone(), floor }).collect()
}

/// Metres or feet and inches: as the layout declares, else as its first floor height is written.
fn length_unit(layout: &Layout) -> LengthUnit {
    let first = layout.units.or_else(|| {
        layout.levels.iter().find_map(|level| match level.floor {
            Measure::Written(written) => Some(written.notation),
            Measure::Number(_) => None,
        })
    });
    match first {
        Some(LengthUnit::Foot | LengthUnit::Inch | LengthUnit::FootInch) => LengthUnit::FootInch,
        _ => LengthUnit::Metre,
    }
}
