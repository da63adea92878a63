//! Layouts with every kind of element, value and notation, for writing and reading back.

use dwv_core::layout::{
    Cleanout, Drain, Fixture, Format, Grounds, Joint, Layout, Level, Runs, Sewer, StatedName, Terminal, Through, Valve,
    Vent,
};
use dwv_core::quantity::{
    FixtureUnits, FlowRate, Length, LengthUnit, Measure, PipeSize, Slope, SlopeNotation, Written,
};
use proptest::option::of;
use proptest::prelude::*;

fn id() -> impl Strategy<Value = String> {
    prop_oneof!["[A-Z]{1,2}[0-9]{0,3}", "\\PC{0,12}", Just("\"\\ \u{7}é".to_owned())]
}

fn measure() -> impl Strategy<Value = Measure> {
    const DECIMAL: [LengthUnit; 5] =
        [LengthUnit::Metre, LengthUnit::Centimetre, LengthUnit::Millimetre, LengthUnit::Foot, LengthUnit::Inch];
    let decimal = (-9_000_000_000_i64..9_000_000_000, prop::sample::select(DECIMAL.as_slice()))
        .prop_map(|(value, unit)| Measure::Written(Written::new(Length::from_nanometres(value), unit)));
    // Feet and inches that are no multiple of 1/64 in are written as decimal inches: the value stays, the notation not.
    let feet_and_inches = (-2000_i64..2000)
        .prop_map(|parts| Measure::Written(Written::new(Length::from_sixty_fourths(parts), LengthUnit::FootInch)));
    let number = (-1_000_000_i32..1_000_000).prop_map(|number| Measure::Number(f64::from(number) / 1000.0));
    prop_oneof![decimal, feet_and_inches, number]
}

fn slope() -> impl Strategy<Value = Written<Slope>> {
    const TEXTS: [&str; 6] = ["1:50", "1:100", "2 %", "2.083 %", "1/4 in per ft", "20 mm/m"];
    let read = prop::sample::select(TEXTS.as_slice()).prop_filter_map("a slope", |text| Slope::parse(text).ok());
    let ratio = (1_u32..1000).prop_map(|run| Written::new(Slope::one_in(run), SlopeNotation::Ratio));
    prop_oneof![read, ratio]
}

fn size() -> impl Strategy<Value = PipeSize> {
    prop::sample::select(PipeSize::ALL.as_slice())
}

fn position() -> impl Strategy<Value = Option<[Measure; 2]>> {
    of([measure(), measure()])
}

fn level() -> impl Strategy<Value = Level> {
    (id(), measure()).prop_map(|(id, floor)| Level { id: id.into(), floor })
}

fn fixture() -> impl Strategy<Value = Fixture> {
    let flow = || {
        of(prop::sample::select(["0.3 L/s", "18 L/min", "5 US gpm"].as_slice())
            .prop_filter_map("a flow", |text| FlowRate::parse(text).ok()))
    };
    let load = of((0_u64..100_000).prop_map(FixtureUnits::from_thousandths));
    let words = (id(), id(), id(), of(id()), any::<bool>());
    (words, position(), of(measure()), of(size()), load, flow(), flow(), of(measure())).prop_map(
        |(
            (id, kind, level, group, future),
            at,
            height,
            trap,
            load,
            continuous_flow,
            semi_continuous_flow,
            outlet_length,
        )| Fixture {
            id: id.into(),
            kind: kind.into(),
            level: level.into(),
            at,
            height,
            trap,
            load,
            continuous_flow,
            semi_continuous_flow,
            group: group.map(Into::into),
            outlet_length,
            future,
        },
    )
}

fn joint() -> impl Strategy<Value = Joint> {
    (id(), id(), position(), of(measure())).prop_map(|(id, level, at, height)| Joint {
        id: id.into(),
        level: level.into(),
        at,
        height,
    })
}

fn drain() -> impl Strategy<Value = Drain> {
    let runs = prop::sample::select([Runs::Level, Runs::Vertical, Runs::Sloped].as_slice());
    let name =
        of(prop::sample::select([StatedName::TrapArm, StatedName::Branch, StatedName::BuildingDrain].as_slice()));
    let pipe = (of(measure()), of(measure()), of(slope()), of(size()), name);
    ((id(), id(), id()), runs, pipe, any::<(bool, bool)>(), of(any::<u16>())).prop_map(
        |((id, from, to), runs, (length, drop, slope, size, name), (underground, outside), turns)| Drain {
            id: id.into(),
            from: from.into(),
            to: to.into(),
            runs,
            length,
            drop,
            slope,
            size,
            name,
            underground,
            outside,
            turns,
        },
    )
}

fn vent() -> impl Strategy<Value = Vent> {
    let name =
        of(prop::sample::select([StatedName::DualVent, StatedName::VentStack, StatedName::VentHeader].as_slice()));
    (id(), id(), id(), of(measure()), of(size()), name).prop_map(|(id, from, to, length, size, name)| Vent {
        id: id.into(),
        from: from.into(),
        to: to.into(),
        length,
        size,
        name,
    })
}

fn terminal() -> impl Strategy<Value = Terminal> {
    let through = prop::sample::select([Through::Roof, Through::Wall].as_slice());
    (id(), through, of(id()), position(), of(measure()), of(measure())).prop_map(
        |(id, through, level, at, height, above)| Terminal {
            id: id.into(),
            through,
            level: level.map(Into::into),
            at,
            height,
            above,
        },
    )
}

fn valve() -> impl Strategy<Value = Valve> {
    const GROUNDS: [Grounds; 4] = [Grounds::Island, Grounds::Frost, Grounds::Renovation, Grounds::NotPractical];
    (id(), of(prop::sample::select(GROUNDS.as_slice())), of(id()), position(), of(measure())).prop_map(
        |(id, grounds, level, at, height)| Valve { id: id.into(), grounds, level: level.map(Into::into), at, height },
    )
}

fn cleanout() -> impl Strategy<Value = Cleanout> {
    (id(), id()).prop_map(|(id, at)| Cleanout { id: id.into(), at: at.into() })
}

/// Any layout, whether or not it makes a drainage system.
pub fn any_layout() -> impl Strategy<Value = Layout> {
    let heads =
        (of(id()), id(), id(), of(prop::sample::select(LengthUnit::ALL.as_slice())), of(any::<bool>()), of(id()));
    let sizes = of(prop::collection::vec(size(), 0..4));
    let elements = (
        prop::collection::vec(level(), 0..3),
        prop::collection::vec(fixture(), 0..3),
        prop::collection::vec(joint(), 0..3),
        prop::collection::vec(drain(), 0..3),
        prop::collection::vec(vent(), 0..3),
        prop::collection::vec(terminal(), 0..3),
        prop::collection::vec(valve(), 0..3),
        prop::collection::vec(cleanout(), 0..3),
    );
    (heads, sizes, elements, id(), of(measure())).prop_map(
        |(
            (schema, name, edition, units, frost_can_close_vents, marked),
            pipe_sizes,
            (levels, fixtures, joints, drains, vents, terminals, valves, cleanouts),
            at,
            invert,
        )| Layout {
            schema,
            format: Format::Version1,
            name: name.into(),
            edition: edition.into(),
            units,
            frost_can_close_vents,
            pipe_sizes,
            building_drain_ends_at: marked.map(Into::into),
            levels,
            fixtures,
            joints,
            drains,
            vents,
            terminals,
            valves,
            cleanouts,
            sewer: Sewer { at: at.into(), invert },
        },
    )
}
