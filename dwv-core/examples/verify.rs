//! The published checks as a table: source, what was asked, expected, obtained. `cargo run --example verify`
//!
//! It reads `tests/published/*-tables.toml` and `tests/cases/*.expect.toml` of the repository.

use std::collections::BTreeMap;
use std::path::{Path, PathBuf};
use std::process::ExitCode;

use dwv_core::{Edition, Layout, Sizing};
use serde_json::{Map, Value};

/// One check with its outcome.
struct Line {
    source: String,
    asked: String,
    expected: String,
    obtained: String,
}

fn main() -> ExitCode {
    match lines() {
        Ok(lines) => print(&lines),
        Err(error) => {
            eprintln!("the checks cannot be read: {error}");
            ExitCode::FAILURE
        }
    }
}

fn print(lines: &[Line]) -> ExitCode {
    let mut by_source: BTreeMap<&str, Vec<&Line>> = BTreeMap::new();
    for line in lines {
        by_source.entry(&line.source).or_default().push(line);
    }
    for (source, lines) in &by_source {
        let agree = lines.iter().filter(|line| line.expected == line.obtained).count();
        println!("\n{source}: {agree} of {} agree", lines.len());
        for line in lines {
            let verdict = if line.expected == line.obtained { "ok" } else { "DIFFERS" };
            println!("  {verdict:<8}{:<72} expected {:<22} obtained {}", line.asked, line.expected, line.obtained);
        }
    }
    let agree = lines.iter().filter(|line| line.expected == line.obtained).count();
    let memory = lines.iter().filter(|line| line.source.starts_with("from memory")).count();
    println!(
        "\n{agree} of {} published checks agree; {memory} of them rest on memory, for want of a printed source",
        lines.len()
    );
    if agree == lines.len() { ExitCode::SUCCESS } else { ExitCode::FAILURE }
}

fn lines() -> Result<Vec<Line>, Box<dyn std::error::Error>> {
    let tests = Path::new(env!("CARGO_MANIFEST_DIR")).join("../tests");
    let mut lines = Vec::new();
    let edition = Edition::builtin("npc-2015")?;
    let file: BTreeMap<String, Vec<Map<String, Value>>> =
        toml::from_str(&std::fs::read_to_string(tests.join("published/npc-2015-tables.toml"))?)?;
    for mut check in file.into_values().flatten() {
        let mut take =
            |key: &str| check.remove(key).and_then(|value| value.as_str().map(str::to_owned)).unwrap_or_default();
        let (expected, source) = (take("expect"), take("source"));
        let asked: Vec<String> =
            check.iter().map(|(key, value)| format!("{key} {}", value.to_string().trim_matches('"'))).collect();
        let answer = edition.answer_json(&Value::Object(check).to_string());
        let obtained = answer.map_or_else(|error| error.to_string(), |answer| answer.text);
        lines.push(Line { source, asked: asked.join(", "), expected, obtained });
    }
    let mut cases: Vec<PathBuf> = std::fs::read_dir(tests.join("cases"))?
        .map(|entry| entry.map(|entry| entry.path()))
        .collect::<Result<_, _>>()?;
    cases.retain(|path| path.to_string_lossy().ends_with(".expect.toml"));
    cases.sort();
    for case in cases {
        lines.extend(case_lines(&case)?);
    }
    Ok(lines)
}

/// What a case expects of single rows.
fn case_lines(case: &Path) -> Result<Vec<Line>, Box<dyn std::error::Error>> {
    let expect: Value = toml::from_str(&std::fs::read_to_string(case)?)?;
    let layout = Layout::from_json(&std::fs::read(case.to_string_lossy().replace(".expect.toml", ".layout.json"))?)?;
    let result: Value = serde_json::from_str(&Sizing::of_layout(&layout)?.to_json())?;
    let lists =
        ["pipes", "vents", "terminals", "fixtures"].map(|list| result[list].as_array().cloned().unwrap_or_default());
    let mut lines = Vec::new();
    for row in expect["row"].as_array().into_iter().flatten() {
        let found = lists.iter().flatten().find(|found| found["id"] == row["id"]).cloned().unwrap_or_default();
        for (key, expected) in
            row.as_object().into_iter().flatten().filter(|(key, _)| !["id", "reason"].contains(&key.as_str()))
        {
            lines.push(Line {
                source: expect["source"].as_str().unwrap_or_default().to_owned(),
                asked: format!("{}: {key} of {}", layout.name, text(&row["id"])),
                expected: text(expected),
                obtained: text(&found[key.as_str()]),
            });
        }
    }
    Ok(lines)
}

fn text(value: &Value) -> String {
    match value {
        Value::String(text) => text.clone(),
        Value::Null => "none".to_owned(),
        other => other.to_string().trim_end_matches(".0").to_owned(),
    }
}
