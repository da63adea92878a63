//! Reads a layout file and writes it again, one element a line: `cargo run --example tidy_layout -- house.layout.json`.

use std::process::ExitCode;

use dwv_core::Layout;

fn main() -> ExitCode {
    let Some(path) = std::env::args().nth(1) else {
        eprintln!("which layout file?");
        return ExitCode::FAILURE;
    };
    let read = std::fs::read(&path).map_err(|error| error.to_string());
    match read.and_then(|bytes| Layout::from_json(&bytes).map_err(|error| error.to_string())) {
        Ok(layout) => {
            print!("{}", layout.to_json());
            ExitCode::SUCCESS
        }
        Err(error) => {
            eprintln!("{path}: {error}");
            ExitCode::FAILURE
        }
    }
}
