//! C programs against the static library: the example, wrong calls, rows, a panic, the shared cases and the published tables.
#![allow(clippy::unwrap_used, clippy::expect_used, clippy::panic)] // A program that cannot be built must fail the test.

#[path = "c_programs/build.rs"]
mod build;

use std::collections::BTreeMap;
use std::path::Path;
use std::process::{Command, Output};

use build::{Program, is_at_hand, root};
use dwv_core::{Layout, Sizing};
use serde_json::{Map, Value};

fn text(bytes: &[u8]) -> String {
    String::from_utf8(bytes.to_vec()).unwrap()
}

/// A program that checks by itself has no failures; where valgrind is at hand, it also leaks nothing and reads nothing that is not there.
fn holds(program: &Program, arguments: &[&str]) {
    let holds = |output: Output| {
        let shown = format!("{}{}", text(&output.stdout), text(&output.stderr));
        assert!(output.status.success(), "{shown}");
    };
    holds(program.run(arguments, b""));
    if !is_at_hand("valgrind") {
        println!("valgrind is not installed: memory was not checked");
        return;
    }
    let flags = ["-q", "--error-exitcode=99", "--leak-check=full", "--errors-for-leak-kinds=definite,indirect"];
    let mut checked = Command::new("valgrind");
    holds(checked.args(flags).arg(&program.path).args(arguments).current_dir(root()).output().unwrap());
}

/// The same built with the sanitizers of the compiler, where it has them.
fn holds_sanitized(source: &str) {
    match Program::sanitized(source) {
        Some(program) => {
            let output = program.run(&[], b"");
            assert!(output.status.success(), "{}{}", text(&output.stdout), text(&output.stderr));
        }
        None => println!("the C compiler has no sanitizers: {source} ran without"),
    }
}

/// What the example prints is what the engine says.
#[test]
fn the_example_sizes_the_house() {
    let program = Program::new("examples/size_house.c");
    let file = "python-examples/house.layout.json";
    let output = program.run(&[file, "bd3"], b"");
    assert!(output.status.success(), "{}", text(&output.stderr));
    let shown = text(&output.stdout);
    let house = Sizing::of_layout(&Layout::from_json(&std::fs::read(root().join(file)).unwrap()).unwrap()).unwrap();
    let mut lines = shown.lines();
    for pipe in house.pipes() {
        let line = lines.next().unwrap();
        let slope = pipe.slope.unwrap_or_else(|| "vertical".to_owned());
        let begins = format!("{:6} {:16} {:>7.3} FU  ", pipe.id, pipe.name, pipe.load.thousandths() as f64 / 1000.0);
        assert!(line.starts_with(&begins), "{begins:?} {line:?}");
        assert!(line.ends_with(&format!("  {} ({})", pipe.governed_by, pipe.clause)), "{line:?}");
        assert!(line.contains(&format!("{:>5} in  {slope}", pipe.size.unwrap().text())), "{line:?}");
    }
    assert_eq!((lines.next(), lines.next()), (Some(""), Some(house.summary().unattested.as_deref().unwrap_or(""))));
    let findings = house.findings();
    for finding in &findings {
        let line = format!("{}: {} ({})", finding.severity.name(), finding.message, finding.clause);
        assert_eq!(lines.next(), Some(line.as_str()));
    }
    assert!(shown.contains(&format!("\n\n{}", house.why("bd3").unwrap())));
    // NPC Table 2.5.7.1., quoted whole in Block D Drainage Systems, D-1.6: a 2 in trap asks for 1-1/2 in.
    assert!(shown.ends_with(&format!("\nleast vent of a 2 in trap: 1.50 in\n\n{}\n", dwv_core::schedule::CAUTION)));
    holds(&program, &[file, "bd3"]);
}

#[test]
fn the_example_says_what_is_wrong() {
    let program = Program::new("examples/size_house.c");
    let wrong = |arguments: &[&str], words: &str| {
        let output = program.run(arguments, b"");
        assert!(!output.status.success() && text(&output.stderr).contains(words), "{}", text(&output.stderr));
    };
    wrong(&["python-examples/house.layout.json", "bd33"], "bd33: no pipe, fixture or terminal has the id `bd33`");
    wrong(&["README.md"], "README.md: ");
    wrong(&["no such file"], "no such file: ");
    wrong(&[], "usage: ");
}

#[test]
fn wrong_calls_come_back_with_their_status() {
    holds(&Program::new("tests/c/refusals.c"), &[]);
    holds_sanitized("tests/c/refusals.c");
}

#[test]
fn plain_calls_give_the_values_of_tables() {
    holds(&Program::new("tests/c/plain_calls.c"), &[]);
    holds_sanitized("tests/c/plain_calls.c");
}

#[test]
fn several_threads_read_the_same_rows() {
    holds(&Program::new("tests/c/rows.c"), &[]);
    holds_sanitized("tests/c/rows.c");
}

#[test]
fn a_panic_becomes_a_status() {
    let program = Program::linked("tests/c/panic.c", &build::panicking_library());
    let output = program.run(&[], b"");
    assert!(output.status.success(), "{}{}", text(&output.stdout), text(&output.stderr));
}

#[test]
fn the_header_is_cpp_too() {
    if !is_at_hand("c++") {
        println!("no C++ compiler is at hand: the header was not compiled as C++");
        return;
    }
    let program = Program::cpp("tests/c/answers.c");
    let output = program.run(&[], b"{\"ask\": \"vent-for-trap\", \"trap\": \"2\"}\n");
    assert_eq!(text(&output.stdout), "1-1/2\n");
}

#[test]
fn every_case_gives_the_canonical_result() {
    let program = Program::new("tests/c/canonical.c");
    let folder = root().join("tests/cases");
    let mut count = 0;
    for entry in std::fs::read_dir(&folder).unwrap() {
        let path = entry.unwrap().path();
        let Some(name) = path.to_string_lossy().strip_suffix(".layout.json").map(str::to_owned) else { continue };
        let output = program.run(&[], &std::fs::read(&path).unwrap());
        assert!(output.status.success(), "{name}: {}", text(&output.stderr));
        assert!(output.stdout == std::fs::read(format!("{name}.sizing.json")).unwrap(), "{name} differs");
        count += 1;
    }
    let stated = std::fs::read_to_string(folder.join("count.txt")).unwrap();
    assert_eq!(count, stated.trim().parse::<usize>().unwrap());
}

/// Headers, libraries and the description for pkg-config in the folders where packages put them.
fn install(prefix: &Path, library: &str) {
    for folder in ["include", "lib/pkgconfig"] {
        std::fs::create_dir_all(prefix.join(folder)).unwrap();
    }
    std::fs::copy(root().join("include/dwv.h"), prefix.join("include/dwv.h")).unwrap();
    std::fs::copy(build::built().join(library), prefix.join("lib").join(library)).unwrap();
    let description = std::fs::read_to_string(root().join("dwv-capi/dwv.pc.in")).unwrap();
    let description =
        description.replace("@prefix@", &prefix.to_string_lossy()).replace("@version@", env!("CARGO_PKG_VERSION"));
    std::fs::write(prefix.join("lib/pkgconfig/dwv.pc"), description).unwrap();
}

/// The example compiles with what pkg-config says of an installed library, and not without.
fn compiles_where_installed(library: &str, flags: &[&str]) {
    if !is_at_hand("pkg-config") {
        println!("pkg-config is not installed: its description was not tried");
        return;
    }
    let prefix = build::temporary().join(format!("installed-{library}"));
    install(&prefix, library);
    let mut asked = Command::new("pkg-config");
    asked.args(flags).args(["--cflags", "--libs", &format!("dwv = {}", env!("CARGO_PKG_VERSION"))]);
    let told = asked.env("PKG_CONFIG_PATH", prefix.join("lib/pkgconfig")).output().unwrap();
    assert!(told.status.success(), "{}", text(&told.stderr));
    let told = text(&told.stdout);
    let program = prefix.join("size_house");
    let compile = |arguments: &[&str]| {
        let source = root().join("dwv-capi/examples/size_house.c");
        Command::new("cc").arg(source).args(arguments).arg("-o").arg(&program).output().unwrap().status.success()
    };
    assert!(!compile(&[]));
    assert!(compile(&told.split_whitespace().collect::<Vec<_>>()), "{told}");
    let mut command = Command::new(&program);
    command.arg("python-examples/house.layout.json").current_dir(root());
    let output = command.env("LD_LIBRARY_PATH", prefix.join("lib")).output().unwrap();
    assert!(output.status.success() && output.stdout.len() > 1000, "{}", text(&output.stderr));
}

#[test]
fn the_example_compiles_with_an_installed_static_library() {
    compiles_where_installed("libdwv.a", &["--static"]);
}

#[test]
fn the_example_compiles_with_an_installed_shared_library() {
    if cfg!(target_os = "linux") {
        compiles_where_installed("libdwv.so", &[]);
    } else {
        println!("only tried on Linux: shared libraries have other names elsewhere");
    }
}

/// The checks of a file against its published tables, as questions and answers.
fn published(file: &Path) -> (String, Vec<String>) {
    let file: BTreeMap<String, Vec<Map<String, Value>>> =
        toml::from_str(&std::fs::read_to_string(file).unwrap()).unwrap();
    let (mut questions, mut expected) = (String::new(), Vec::new());
    for mut check in file.into_values().flatten() {
        expected.push(check.remove("expect").unwrap().as_str().unwrap().to_owned());
        check.remove("source");
        questions.push_str(&Value::Object(check).to_string());
        questions.push('\n');
    }
    (questions, expected)
}

#[test]
fn every_published_check_agrees() {
    let program = Program::new("tests/c/answers.c");
    let (questions, expected) = published(&root().join("tests/published/npc-2015-tables.toml"));
    let answers = text(&program.run(&[], questions.as_bytes()).stdout);
    let differences: Vec<_> = questions
        .lines()
        .zip(expected.iter().zip(answers.lines()))
        .filter(|(_, (expected, obtained))| expected != obtained)
        .collect();
    assert!(differences.is_empty(), "{differences:#?}");
    // The number of checks may grow and not fall.
    assert!(expected.len() >= 730 && answers.lines().count() == expected.len(), "{} checks", expected.len());
}
