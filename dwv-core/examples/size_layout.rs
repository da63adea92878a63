//! Sizes a layout file and prints the report: `cargo run --example size_layout -- house.layout.json [pipe …]`.

use std::process::ExitCode;

use dwv_core::{Layout, Sizing};

fn main() -> ExitCode {
    let mut arguments = std::env::args().skip(1);
    let Some(path) = arguments.next() else {
        eprintln!("which layout file?");
        return ExitCode::FAILURE;
    };
    match report(&path, &arguments.collect::<Vec<_>>()) {
        Ok(report) => {
            print!("{report}");
            ExitCode::SUCCESS
        }
        Err(error) => {
            eprintln!("{path}: {error}");
            ExitCode::FAILURE
        }
    }
}

/// The whole report, or why some pipes are what they are.
fn report(path: &str, pipes: &[String]) -> Result<String, Box<dyn std::error::Error>> {
    let sizing = Sizing::of_layout(&Layout::from_json(&std::fs::read(path)?)?)?;
    if pipes.is_empty() {
        return Ok(sizing.to_text());
    }
    Ok(pipes.iter().map(|pipe| sizing.why(pipe)).collect::<Result<Vec<_>, _>>()?.join("\n"))
}
