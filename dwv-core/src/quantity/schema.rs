//! How quantities look in a layout file, for its JSON Schema.

use std::borrow::Cow;

use schemars::{JsonSchema, Schema, SchemaGenerator, json_schema};

use super::{FixtureUnits, FlowRate, LengthUnit, Measure, PipeSize, Slope, Written};

impl JsonSchema for Measure {
    fn schema_name() -> Cow<'static, str> {
        "Length".into()
    }

    fn json_schema(_: &mut SchemaGenerator) -> Schema {
        json_schema!({
            "description": "A length: text with its unit, or a bare number under the declared unit.",
            "type": ["string", "number"],
            "examples": ["1.2 m", "450 mm", "3'-6 1/2\""]
        })
    }
}

impl JsonSchema for Written<Slope> {
    fn schema_name() -> Cow<'static, str> {
        "Slope".into()
    }

    fn json_schema(_: &mut SchemaGenerator) -> Schema {
        json_schema!({ "description": "A slope.", "type": "string", "examples": ["1:50", "2 %", "1/4 in per ft"] })
    }
}

impl JsonSchema for Written<FlowRate> {
    fn schema_name() -> Cow<'static, str> {
        "Flow".into()
    }

    fn json_schema(_: &mut SchemaGenerator) -> Schema {
        json_schema!({ "description": "A flow.", "type": "string", "examples": ["0.3 L/s", "5 US gpm"] })
    }
}

impl JsonSchema for PipeSize {
    fn schema_name() -> Cow<'static, str> {
        "PipeSize".into()
    }

    fn json_schema(_: &mut SchemaGenerator) -> Schema {
        json_schema!({
            "description": "A nominal pipe size in inches.",
            "type": ["string", "number"],
            "examples": PipeSize::ALL.map(PipeSize::text)
        })
    }
}

impl JsonSchema for FixtureUnits {
    fn schema_name() -> Cow<'static, str> {
        "FixtureUnits".into()
    }

    fn json_schema(_: &mut SchemaGenerator) -> Schema {
        json_schema!({ "description": "A load in fixture units.", "type": ["number", "string"], "minimum": 0, "examples": [1.5] })
    }
}

impl JsonSchema for LengthUnit {
    fn schema_name() -> Cow<'static, str> {
        "LengthUnit".into()
    }

    fn json_schema(_: &mut SchemaGenerator) -> Schema {
        json_schema!({ "description": "A unit of length.", "enum": LengthUnit::ALL.map(LengthUnit::symbol) })
    }
}
