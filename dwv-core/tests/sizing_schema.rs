//! The committed JSON Schema of the canonical result is that of the types.
#![cfg(feature = "schema")]
#![allow(clippy::unwrap_used)] // What cannot be read must fail the test.

use std::path::Path;

#[test]
fn the_schema_is_current() {
    let file = Path::new(env!("CARGO_MANIFEST_DIR")).join("schemas/dwv-sizing-1.schema.json");
    let schema = dwv_core::schedule::sizing_schema();
    if std::env::var_os("DWV_REWRITE").is_some() {
        std::fs::write(&file, &schema).unwrap();
    }
    assert_eq!(
        std::fs::read_to_string(&file).unwrap(),
        schema,
        "run again with DWV_REWRITE=1 and look at what changed"
    );
}
