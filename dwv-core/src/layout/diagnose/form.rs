//! The format `dwv-layout/1` as one table: the objects, their keys and what stands under each.
//!
//! Tests hold it against the types that the quick reader fills and against the JSON Schema.

/// An object of the format.
#[derive(Debug)]
pub(super) struct Form {
    /// What it is called, with its article.
    pub(super) what: &'static str,
    /// Its keys, in the order in which they are written.
    pub(super) fields: &'static [Field],
}

/// A key of an object.
#[derive(Debug)]
pub(super) struct Field {
    pub(super) key: &'static str,
    pub(super) presence: Presence,
    pub(super) value: Value,
}

/// Whether a key must be there.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) enum Presence {
    /// It must be there.
    Required,
    /// It may be left out or be `null`.
    Optional,
    /// It may be left out; then it is false or empty. It may not be `null`.
    Defaulted,
}

/// What stands under a key.
#[derive(Debug)]
pub(super) enum Value {
    /// The name of the format.
    Format,
    /// Any text.
    Text,
    /// The id of an element, or of one that is referred to.
    Id,
    /// One of some words.
    Word(&'static [&'static str]),
    /// A unit of length.
    Unit,
    /// A length, a height or a coordinate.
    Length,
    /// Two coordinates.
    Position,
    Slope,
    Flow,
    Size,
    Load,
    /// `true` or `false`.
    Flag,
    /// A whole number of degrees.
    Degrees,
    /// A list of such values.
    List(&'static Value),
    Object(&'static Form),
}

pub(super) const FORMAT: &str = "dwv-layout/1";

const fn required(key: &'static str, value: Value) -> Field {
    Field { key, presence: Presence::Required, value }
}

const fn optional(key: &'static str, value: Value) -> Field {
    Field { key, presence: Presence::Optional, value }
}

const fn defaulted(key: &'static str, value: Value) -> Field {
    Field { key, presence: Presence::Defaulted, value }
}

const RUNS: Value = Value::Word(&["level", "vertical", "sloped"]);
const THROUGH: Value = Value::Word(&["roof", "wall"]);
const GROUNDS: Value = Value::Word(&["island", "frost", "renovation", "not-practical"]);
const STATED_NAME: Value = Value::Word(&[
    "trap-arm",
    "fixture-drain",
    "branch",
    "stack",
    "building-drain",
    "building-sewer",
    "individual-vent",
    "dual-vent",
    "continuous-vent",
    "branch-vent",
    "stack-vent",
    "vent-stack",
    "vent-header",
]);

pub(super) static LAYOUT: Form = Form {
    what: "a layout",
    fields: &[
        optional("$schema", Value::Text),
        required("format", Value::Format),
        required("name", Value::Text),
        required("edition", Value::Text),
        optional("units", Value::Unit),
        optional("frost_can_close_vents", Value::Flag),
        optional("pipe_sizes", Value::List(&Value::Size)),
        optional("building_drain_ends_at", Value::Id),
        required("levels", Value::List(&Value::Object(&LEVEL))),
        required("fixtures", Value::List(&Value::Object(&FIXTURE))),
        defaulted("joints", Value::List(&Value::Object(&JOINT))),
        required("drains", Value::List(&Value::Object(&DRAIN))),
        defaulted("vents", Value::List(&Value::Object(&VENT))),
        defaulted("terminals", Value::List(&Value::Object(&TERMINAL))),
        defaulted("valves", Value::List(&Value::Object(&VALVE))),
        defaulted("cleanouts", Value::List(&Value::Object(&CLEANOUT))),
        required("sewer", Value::Object(&SEWER)),
    ],
};

static LEVEL: Form = Form { what: "a level", fields: &[required("id", Value::Id), required("floor", Value::Length)] };

static FIXTURE: Form = Form {
    what: "a fixture",
    fields: &[
        required("id", Value::Id),
        required("kind", Value::Text),
        required("level", Value::Id),
        optional("at", Value::Position),
        optional("height", Value::Length),
        optional("trap", Value::Size),
        optional("load", Value::Load),
        optional("continuous_flow", Value::Flow),
        optional("semi_continuous_flow", Value::Flow),
        optional("group", Value::Id),
        optional("outlet_length", Value::Length),
        defaulted("future", Value::Flag),
    ],
};

static JOINT: Form = Form {
    what: "a joint",
    fields: &[
        required("id", Value::Id),
        required("level", Value::Id),
        optional("at", Value::Position),
        optional("height", Value::Length),
    ],
};

static DRAIN: Form = Form {
    what: "a drain",
    fields: &[
        required("id", Value::Id),
        required("from", Value::Id),
        required("to", Value::Id),
        required("runs", RUNS),
        optional("length", Value::Length),
        optional("drop", Value::Length),
        optional("slope", Value::Slope),
        optional("size", Value::Size),
        optional("name", STATED_NAME),
        defaulted("underground", Value::Flag),
        defaulted("outside", Value::Flag),
        optional("turns", Value::Degrees),
    ],
};

static VENT: Form = Form {
    what: "a vent",
    fields: &[
        required("id", Value::Id),
        required("from", Value::Id),
        required("to", Value::Id),
        optional("length", Value::Length),
        optional("size", Value::Size),
        optional("name", STATED_NAME),
    ],
};

static TERMINAL: Form = Form {
    what: "a terminal",
    fields: &[
        required("id", Value::Id),
        required("through", THROUGH),
        optional("level", Value::Id),
        optional("at", Value::Position),
        optional("height", Value::Length),
        optional("above", Value::Length),
    ],
};

static VALVE: Form = Form {
    what: "a valve",
    fields: &[
        required("id", Value::Id),
        optional("grounds", GROUNDS),
        optional("level", Value::Id),
        optional("at", Value::Position),
        optional("height", Value::Length),
    ],
};

static CLEANOUT: Form = Form { what: "a cleanout", fields: &[required("id", Value::Id), required("at", Value::Id)] };

static SEWER: Form =
    Form { what: "the sewer connection", fields: &[required("at", Value::Id), optional("invert", Value::Length)] };
