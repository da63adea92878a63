//! Nanoseconds per pipe for reading, indexing and each pass: houses of fifty pipes, and a street of a million pipes.
//!
//! Figures are for people and hold for one machine in one run; what counts are the ratios. With `--houses N` it sizes N houses once
//! and prints nothing, for a counter of instructions to look at.

#![allow(clippy::unwrap_used)] // A drawing of this file that cannot be sized must stop the measurement.

mod drawings;

use std::hint::black_box;
use std::time::Instant;

use dwv_core::sizing::Operands;
use dwv_core::{Columns, Edition, Layout, Network};

fn main() {
    let arguments: Vec<String> = std::env::args().collect();
    if let Some(at) = arguments.iter().position(|argument| argument == "--houses") {
        let houses = arguments.get(at + 1).and_then(|count| count.parse().ok()).unwrap_or(1);
        return run_once(houses);
    }
    let small = measure(1, 2000);
    let large = measure(1_000_000 / drawings::PIPES_OF_A_HOUSE, 3);
    println!("{:<34}{:>14}{:>18}{:>10}", "ns per pipe", "50 pipes", "1,000,000 pipes", "ratio");
    for ((name, small), (_, large)) in small.iter().zip(&large) {
        println!("{name:<34}{small:>14.1}{large:>18.1}{:>10.2}", large / small);
    }
    let get = |list: &[(&'static str, f64)], wanted: &str| {
        list.iter().find(|(name, _)| *name == wanted).map_or(f64::NAN, |(_, value)| *value)
    };
    for (size, list) in [("50 pipes", &small), ("1,000,000 pipes", &large)] {
        let ratio = get(list, "read the file") / get(list, "plain typed serde_json");
        println!("{size}: reading takes {ratio:.2} times plain typed serde_json of the same bytes");
        println!("{size}: all passes with reasons {:.0} ns a pipe", get(list, "all passes"));
    }
    println!(
        "indexing looks ids up in a hash table that no longer fits the cache for the large layout; the passes hash nothing"
    );
}

/// The least time of several runs, in nanoseconds per pipe.
fn least(pipes: usize, runs: usize, mut work: impl FnMut()) -> f64 {
    work();
    let mut least = f64::INFINITY;
    for _ in 0..runs {
        let start = Instant::now();
        work();
        least = least.min(start.elapsed().as_nanos() as f64);
    }
    least / pipes as f64
}

fn measure(houses: usize, runs: usize) -> Vec<(&'static str, f64)> {
    let edition = Edition::builtin("npc-2015").unwrap();
    let file = drawings::street(houses);
    let layout = Layout::from_json(file.as_bytes()).unwrap();
    let network = Network::new(&layout, &edition).unwrap();
    let pipes = network.drains.len() + network.vents.len();
    let mut figures = vec![
        (
            "plain typed serde_json",
            least(pipes, runs, || {
                black_box(serde_json::from_str::<Layout>(&file).unwrap());
            }),
        ),
        (
            "read the file",
            least(pipes, runs, || {
                black_box(Layout::from_json(file.as_bytes()).unwrap());
            }),
        ),
        (
            "index the network",
            least(pipes, runs, || {
                black_box(Network::new(&layout, &edition).unwrap());
            }),
        ),
    ];
    let mut columns = Columns::default();
    let Columns { loads, names, stack_loads, wet_loads, vent_loads, sizes, grades, findings } = &mut columns;
    figures.push(("loads", least(pipes, runs, || loads.collect(&network, &edition))));
    figures.push(("names and air", least(pipes, runs, || names.find(&network, &edition, loads))));
    figures.push(("stack loads", least(pipes, runs, || stack_loads.collect(&network, names, loads))));
    figures.push(("wet vent loads", least(pipes, runs, || wet_loads.collect(&network, names, loads))));
    figures.push(("vent loads", least(pipes, runs, || vent_loads.collect(&network, names, loads))));
    let operands = Operands { network: &network, edition: &edition, names, loads, stack_loads, vent_loads, wet_loads };
    figures.push(("sizes with reasons", least(pipes, runs, || sizes.find(&operands))));
    figures.push(("grades", least(pipes, runs, || grades.find(&operands, sizes))));
    figures.push(("checks", least(pipes, runs, || findings.find(&operands, sizes, grades))));
    figures.push(("all passes", least(pipes, runs, || columns.run(&network, &edition))));
    figures
}

fn run_once(houses: usize) {
    let edition = Edition::builtin("npc-2015").unwrap();
    let layout = Layout::from_json(drawings::street(1).as_bytes()).unwrap();
    let network = Network::new(&layout, &edition).unwrap();
    let mut columns = Columns::default();
    for _ in 0..houses {
        columns.run(&network, &edition);
    }
    black_box(columns);
}
