//! The JSON Schema that is shipped is the one of the types.
#![cfg(feature = "schema")]

use dwv_core::layout::Layout;
use serde_json::Value;

/// Set `DWV_REWRITE=1` to write the file anew.
#[test]
fn the_shipped_schema_is_current() {
    let path = concat!(env!("CARGO_MANIFEST_DIR"), "/schemas/dwv-layout-1.schema.json");
    let schema = Layout::file_schema();
    if std::env::var_os("DWV_REWRITE").is_some_and(|value| value == "1") {
        std::fs::write(path, &schema).unwrap();
    }
    let shipped = std::fs::read_to_string(path).unwrap_or_default();
    assert!(shipped == schema, "the schema has changed: run this test with DWV_REWRITE=1 and look at the difference");
}

#[test]
fn the_schema_names_itself_and_takes_no_other_keys() {
    let schema: Value = serde_json::from_str(&Layout::file_schema()).unwrap();
    assert_eq!(schema["$schema"], "https://json-schema.org/draft/2020-12/schema");
    assert_eq!(schema["$id"], "dwv-layout-1.schema.json");
    assert!(schema["title"].is_string());
    assert_eq!(schema["additionalProperties"], false);
    let parts = schema["$defs"].as_object().unwrap();
    let objects: Vec<_> = parts.iter().filter(|(_, part)| part["type"] == "object").collect();
    assert_eq!(objects.len(), 9, "level, fixture, joint, drain, vent, terminal, valve, cleanout, sewer");
    assert!(objects.iter().all(|(_, part)| part["additionalProperties"] == false));
}
