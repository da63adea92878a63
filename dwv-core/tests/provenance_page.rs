//! The committed page on where the values of an edition come from is that of the edition.
#![allow(clippy::unwrap_used)] // What cannot be read must fail the test.

use std::path::Path;

use dwv_core::Edition;

#[test]
fn the_page_is_current() {
    for id in Edition::builtin_ids() {
        let file = Path::new(env!("CARGO_MANIFEST_DIR")).join(format!("editions/{id}.provenance.md"));
        let page = Edition::builtin(id).unwrap().provenance();
        if std::env::var_os("DWV_REWRITE").is_some() {
            std::fs::write(&file, &page).unwrap();
        }
        assert_eq!(
            std::fs::read_to_string(&file).unwrap(),
            page,
            "run again with DWV_REWRITE=1 and look at what changed"
        );
    }
}
