//! The JSON Schema of layout files, for editors and other programs.

use schemars::generate::SchemaSettings;
use serde_json::Value;

use super::Layout;

/// The name of the schema's file.
const ID: &str = "dwv-layout-1.schema.json";

/// The JSON Schema (draft 2020-12) of layout files, made from the types that read them.
#[must_use]
pub fn layout_schema() -> String {
    let schema = SchemaSettings::draft2020_12().into_generator().into_root_schema_for::<Layout>();
    let mut schema = schema.to_value();
    if let Value::Object(keys) = &mut schema {
        keys.insert("$id".to_owned(), Value::from(ID));
        keys.insert("title".to_owned(), Value::from("Layout of drainage, waste and vent piping (dwv-layout/1)"));
    }
    // The same text whatever order of keys serde_json was built for.
    schema.sort_all_objects();
    format!("{schema:#}\n")
}

impl Layout {
    /// The JSON Schema (draft 2020-12) of layout files.
    #[must_use]
    pub fn file_schema() -> String {
        layout_schema()
    }
}
