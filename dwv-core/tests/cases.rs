//! The cases that all faces share: each a layout, what its source expects, and the canonical result.
//!
//! `*.expect.toml` says what must come out, worked out from its source. `*.sizing.json` is the whole result, which every face must
//! give to the byte; `DWV_REWRITE=1` writes it anew, for a person to look at.
#![allow(clippy::unwrap_used)] // A case that cannot be read must fail the test.

use std::collections::BTreeMap;
use std::path::{Path, PathBuf};

use dwv_core::{Edition, Layout, Sizing, Unattested};
use serde::Deserialize;
use serde_json::Value;

#[derive(Deserialize)]
#[serde(deny_unknown_fields)]
struct Expect {
    title: String,
    source: String,
    #[serde(default)]
    #[allow(dead_code)] // For people.
    note: Option<String>,
    /// Every violation, by check and element.
    findings: Vec<String>,
    row: Vec<Row>,
}

#[derive(Deserialize)]
struct Row {
    id: String,
    /// One of its minimums, governing or not.
    reason: Option<BTreeMap<String, String>>,
    #[serde(flatten)]
    keys: BTreeMap<String, String>,
}

fn folder() -> PathBuf {
    Path::new(env!("CARGO_MANIFEST_DIR")).join("../tests/cases")
}

fn cases() -> Vec<PathBuf> {
    let mut cases: Vec<PathBuf> = std::fs::read_dir(folder())
        .unwrap()
        .map(|entry| entry.unwrap().path())
        .filter(|path| path.to_string_lossy().ends_with(".layout.json"))
        .collect();
    cases.sort();
    cases
}

fn beside(layout: &Path, ending: &str) -> PathBuf {
    PathBuf::from(layout.to_string_lossy().replace(".layout.json", ending))
}

fn size(layout: &Path) -> Sizing {
    let layout = Layout::from_json(&std::fs::read(layout).unwrap()).unwrap();
    Sizing::of(&layout, Edition::builtin(&layout.edition).unwrap(), Unattested::Tell).unwrap()
}

/// A value of the result as the case writes it.
fn text(value: &Value) -> String {
    match value {
        Value::String(text) => text.clone(),
        Value::Null => "none".to_owned(),
        Value::Number(number) => number.to_string().trim_end_matches(".0").to_owned(),
        other => other.to_string(),
    }
}

/// What of a case does not come out.
fn differences(case: &Path) -> Vec<String> {
    let expect: Expect = toml::from_str(&std::fs::read_to_string(beside(case, ".expect.toml")).unwrap()).unwrap();
    let result: Value = serde_json::from_str(&size(case).to_json()).unwrap();
    let mut differences = Vec::new();
    let mut differs = |what: String, expected: &str, obtained: &str| {
        if expected != obtained {
            differences.push(format!("{what}: expected {expected}, obtained {obtained}"));
        }
    };
    let lists = ["pipes", "vents", "terminals", "fixtures"];
    let rows = || lists.iter().flat_map(|list| result[*list].as_array().unwrap());
    for row in &expect.row {
        let found = rows().find(|found| found["id"] == row.id.as_str());
        let Some(found) = found else {
            differs(row.id.clone(), "a row", "none");
            continue;
        };
        for (key, expected) in &row.keys {
            let obtained = found.get(key).map_or_else(|| "no such key".to_owned(), text);
            differs(format!("{} {key}", row.id), expected, &obtained);
        }
        if let Some(reason) = &row.reason {
            let held = found["reasons"]
                .as_array()
                .unwrap()
                .iter()
                .any(|found| reason.iter().all(|(key, value)| text(&found[key.as_str()]) == *value));
            differs(format!("{} reason {reason:?}", row.id), "held", if held { "held" } else { "not among them" });
        }
    }
    let mut violations: Vec<String> = result["findings"]
        .as_array()
        .unwrap()
        .iter()
        .filter(|finding| finding["severity"] == "violation")
        .map(|finding| format!("{} {}", text(&finding["check"]), text(&finding["element"])).replace(" none", ""))
        .collect();
    violations.sort();
    let mut expected = expect.findings.clone();
    expected.sort();
    differs("violations".to_owned(), &expected.join(", "), &violations.join(", "));
    assert!(!expect.title.is_empty() && !expect.source.is_empty());
    differences
}

#[test]
fn every_case_comes_out_as_its_source_says() {
    let mut failed = Vec::new();
    for case in cases() {
        for difference in differences(&case) {
            failed.push(format!("{}: {difference}", case.file_name().unwrap().to_string_lossy()));
        }
    }
    assert!(failed.is_empty(), "\n{}", failed.join("\n"));
}

#[test]
fn every_case_gives_the_canonical_result() {
    for case in cases() {
        let json = size(&case).to_json();
        let file = beside(&case, ".sizing.json");
        if std::env::var_os("DWV_REWRITE").is_some() {
            std::fs::write(&file, &json).unwrap();
        }
        assert_eq!(std::fs::read_to_string(&file).unwrap(), json, "{}", file.display());
    }
}

/// The number of cases may grow and not fall; all faces look at the same number.
#[test]
fn no_case_is_lost() {
    let stated: usize = std::fs::read_to_string(folder().join("count.txt")).unwrap().trim().parse().unwrap();
    assert_eq!(cases().len(), stated);
}
