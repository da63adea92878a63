//! The committed header is the one of the sources, and the exported functions are those that it declares.
#![allow(clippy::unwrap_used, clippy::expect_used)] // What cannot be generated or read must fail the test.

use std::path::Path;
use std::process::Command;

fn header() -> String {
    let folder = Path::new(env!("CARGO_MANIFEST_DIR"));
    let mut config = cbindgen::Config::from_file(folder.join("cbindgen.toml")).unwrap();
    config.after_includes = Some(format!(
        "\n/* The version that this header belongs to; `dwv_version()` gives that of the library. */\n\
         #define DWV_VERSION \"{}\"\n#define DWV_VERSION_MAJOR {}\n#define DWV_VERSION_MINOR {}\n#define DWV_VERSION_PATCH {}",
        env!("CARGO_PKG_VERSION"),
        env!("CARGO_PKG_VERSION_MAJOR"),
        env!("CARGO_PKG_VERSION_MINOR"),
        env!("CARGO_PKG_VERSION_PATCH"),
    ));
    let mut text = Vec::new();
    cbindgen::Builder::new().with_crate(folder).with_config(config).generate().unwrap().write(&mut text);
    String::from_utf8(text).unwrap().replace(" # Safety\n", " Required of the caller:\n")
}

/// The functions that it is promised to keep: one that is taken away or renamed breaks programs, so that the list is kept by hand.
fn listed() -> Vec<&'static str> {
    include_str!("functions.txt").lines().collect()
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

#[test]
fn every_function_of_the_list_is_declared_and_no_other() {
    let header = header();
    let code: String = header.split("/*").map(|part| part.split_once("*/").map_or(part, |(_, code)| code)).collect();
    let mut declared: Vec<&str> = code
        .split(|letter: char| !letter.is_ascii_alphanumeric() && letter != '_' && letter != '(')
        .filter_map(|word| word.split_once('(').map(|(name, _)| name))
        .filter(|name| name.starts_with("dwv_"))
        .collect();
    declared.sort_unstable();
    assert_eq!(declared, listed());
}

/// A function that can fail says with which status; one that takes pointers says what is required of them.
#[test]
fn every_function_says_what_is_required_and_what_it_gives() {
    let header = header();
    for name in listed() {
        let place = header.find(&format!("{name}(void")).or_else(|| header.find(&format!("{name}("))).unwrap();
        let words = header[..place].rsplit("/*").next().unwrap();
        let takes_nothing =
            ["(void)", "(int32_t status)"].iter().any(|end| header[place + name.len()..].starts_with(end));
        assert!(takes_nothing || words.contains("Required of the caller:"), "{name}");
        let can_fail = words.ends_with("dwv_status ");
        assert!(!can_fail || name == "dwv_error_status" || words.contains("\n Status: `DWV_ERROR_"), "{name}");
    }
}

#[test]
fn the_shared_library_exports_the_list_and_nothing_else() {
    if !cfg!(target_os = "linux") {
        println!("the names of symbols are only read on Linux: the exports were not compared");
        return;
    }
    let test = std::env::current_exe().unwrap();
    let library = test.with_file_name("libdwv.so");
    let output = Command::new("nm").args(["-D", "--defined-only"]).arg(&library).output().expect("nm is at hand");
    assert!(output.status.success(), "{}", String::from_utf8_lossy(&output.stderr));
    let symbols = String::from_utf8(output.stdout).unwrap();
    let mut exported: Vec<&str> = symbols.lines().filter_map(|line| line.split_whitespace().last()).collect();
    exported.sort_unstable();
    assert_eq!(exported, listed());
}
