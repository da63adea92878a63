//! The committed header is the one of the sources, and the exported functions are those that it declares.
#![allow(clippy::unwrap_used)] // What cannot be generated must fail the test.

use std::path::Path;

fn header() -> String {
    let folder = Path::new(env!("CARGO_MANIFEST_DIR"));
    let mut config = cbindgen::Config::from_file(folder.join("cbindgen.toml")).unwrap();
    let part = |text: &str| text.parse::<u32>().unwrap();
    config.after_includes = Some(format!(
        "\n#define DWV_VERSION \"{}\"\n#define DWV_VERSION_NUMBER {}",
        env!("CARGO_PKG_VERSION"),
        part(env!("CARGO_PKG_VERSION_MAJOR")) * 10_000
            + part(env!("CARGO_PKG_VERSION_MINOR")) * 100
            + part(env!("CARGO_PKG_VERSION_PATCH"))
    ));
    let mut text = Vec::new();
    cbindgen::Builder::new().with_crate(folder).with_config(config).generate().unwrap().write(&mut text);
    String::from_utf8(text).unwrap().replace(" # Safety\n", " Required of the caller:\n")
}

#[test]
fn the_header_is_current() {
    let file = Path::new(env!("CARGO_MANIFEST_DIR")).join("../include/dwv.h");
    let header = header();
    if std::env::var_os("DWV_REWRITE").is_some() {
        std::fs::write(&file, &header).unwrap();
    }
    assert_eq!(
        std::fs::read_to_string(&file).unwrap(),
        header,
        "run again with DWV_REWRITE=1 and look at what changed"
    );
}

/// A function that is taken away or renamed breaks programs: the list is kept by hand.
#[test]
fn every_function_of_the_list_is_declared_and_no_other() {
    let listed = include_str!("functions.txt");
    let listed: Vec<&str> = listed.lines().collect();
    let header = header();
    let mut declared: Vec<&str> = header
        .split(|letter: char| !letter.is_ascii_alphanumeric() && letter != '_' && letter != '(')
        .filter_map(|word| word.split_once('(').map(|(name, _)| name))
        .filter(|name| name.starts_with("dwv_"))
        .collect();
    declared.sort_unstable();
    declared.dedup();
    assert_eq!(declared, listed);
}
