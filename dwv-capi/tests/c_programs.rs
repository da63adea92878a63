//! C programs against the static library: the example, wrong calls, the shared cases and the published tables.
#![allow(clippy::unwrap_used, clippy::expect_used)] // A program that cannot be built must fail the test.

use std::collections::BTreeMap;
use std::io::Write;
use std::path::{Path, PathBuf};
use std::process::{Command, Output, Stdio};

use serde_json::{Map, Value};

fn root() -> PathBuf {
    Path::new(env!("CARGO_MANIFEST_DIR")).join("..")
}

/// The folder of the profile that this test was built in.
fn built() -> PathBuf {
    let test = std::env::current_exe().unwrap();
    test.ancestors().nth(2).unwrap().to_path_buf()
}

/// Builds a C program and gives its path.
fn program(source: &str, compiler: &str, standard: &str) -> PathBuf {
    let name = Path::new(source).file_stem().unwrap().to_string_lossy().into_owned();
    let program = built().join(format!("{name}-{standard}-{}", std::process::id()));
    let library = built().join("deps/libdwv.a");
    assert!(library.exists(), "{} is built with the tests", library.display());
    let output = Command::new(compiler)
        .args([&format!("-std={standard}"), "-Wall", "-Wextra", "-Werror", "-pedantic", "-g", "-I"])
        .arg(root().join("include"))
        .args(["-x", if standard.contains("++") { "c++" } else { "c" }])
        .arg(root().join("dwv-capi").join(source))
        .args(["-x", "none"])
        .arg(library)
        .args(["-lpthread", "-ldl", "-lm", "-o"])
        .arg(&program)
        .output()
        .expect("a C compiler is at hand");
    assert!(output.status.success(), "{}", String::from_utf8_lossy(&output.stderr));
    program
}

fn run(program: &Path, arguments: &[&str], input: &[u8]) -> Output {
    let mut child = Command::new(program)
        .args(arguments)
        .current_dir(root())
        .stdin(Stdio::piped())
        .stdout(Stdio::piped())
        .stderr(Stdio::piped())
        .spawn()
        .unwrap();
    let mut stdin = child.stdin.take().unwrap();
    let input = input.to_vec();
    let writer = std::thread::spawn(move || stdin.write_all(&input));
    let output = child.wait_with_output().unwrap();
    let _ = writer.join().unwrap();
    output
}

fn text(bytes: &[u8]) -> String {
    String::from_utf8(bytes.to_vec()).unwrap()
}

#[test]
fn the_example_sizes_the_house() {
    let program = program("examples/size_house.c", "cc", "c11");
    let output = run(&program, &["python-examples/house.layout.json", "bd3"], b"");
    assert!(output.status.success(), "{}", text(&output.stderr));
    let shown = text(&output.stdout);
    for line in
        ["bs1    building sewer", "`bd3`, building drain from `H` to `W`: 4 in", "least vent of a 2 in trap: 1.50 in"]
    {
        assert!(shown.contains(line), "{line}:\n{shown}");
    }
    let output = run(&program, &["python-examples/house.layout.json", "bd4"], b"");
    assert!(!output.status.success() && text(&output.stderr).contains("did you mean `"), "{}", text(&output.stderr));
    let output = run(&program, &["README.md"], b"");
    assert!(!output.status.success() && text(&output.stderr).starts_with("README.md: "), "{}", text(&output.stderr));
}

#[test]
fn wrong_calls_come_back_with_their_status() {
    let program = program("tests/c/refusals.c", "cc", "c11");
    let output = run(&program, &[], b"");
    assert!(output.status.success(), "{}{}", text(&output.stdout), text(&output.stderr));
    let Ok(checked) = Command::new("valgrind")
        .args(["-q", "--error-exitcode=99", "--leak-check=full", "--errors-for-leak-kinds=definite"])
        .arg(&program)
        .output()
    else {
        println!("valgrind is not installed: memory was not checked");
        return;
    };
    assert!(checked.status.success(), "{}{}", text(&checked.stdout), text(&checked.stderr));
}

#[test]
fn the_header_is_cpp_too() {
    if Command::new("c++").arg("--version").output().is_err() {
        println!("no C++ compiler is at hand: the header was not compiled as C++");
        return;
    }
    let program = program("tests/c/answers.c", "c++", "c++17");
    let output = run(&program, &[], b"{\"ask\": \"vent-for-trap\", \"trap\": \"2\"}\n");
    assert_eq!(text(&output.stdout), "1-1/2\n");
}

#[test]
fn every_case_gives_the_canonical_result() {
    let program = program("tests/c/canonical.c", "cc", "c11");
    let folder = root().join("tests/cases");
    let mut count = 0;
    for entry in std::fs::read_dir(&folder).unwrap() {
        let path = entry.unwrap().path();
        let Some(name) = path.to_string_lossy().strip_suffix(".layout.json").map(str::to_owned) else { continue };
        let output = run(&program, &[], &std::fs::read(&path).unwrap());
        assert!(output.status.success(), "{name}: {}", text(&output.stderr));
        assert!(output.stdout == std::fs::read(format!("{name}.sizing.json")).unwrap(), "{name} differs");
        count += 1;
    }
    let stated = std::fs::read_to_string(folder.join("count.txt")).unwrap();
    assert_eq!(count, stated.trim().parse::<usize>().unwrap());
}

#[test]
fn every_published_check_agrees() {
    let program = program("tests/c/answers.c", "cc", "c11");
    let file = std::fs::read_to_string(root().join("tests/published/npc-2015-tables.toml")).unwrap();
    let file: BTreeMap<String, Vec<Map<String, Value>>> = toml::from_str(&file).unwrap();
    let (mut questions, mut expected) = (String::new(), Vec::new());
    for mut check in file.into_values().flatten() {
        expected.push(check.remove("expect").unwrap().as_str().unwrap().to_owned());
        check.remove("source");
        questions.push_str(&Value::Object(check).to_string());
        questions.push('\n');
    }
    let output = run(&program, &[], questions.as_bytes());
    let answers = text(&output.stdout);
    let differences: Vec<_> = questions
        .lines()
        .zip(expected.iter().zip(answers.lines()))
        .filter(|(_, (expected, obtained))| expected != obtained)
        .collect();
    assert!(differences.is_empty(), "{differences:#?}");
    assert_eq!(answers.lines().count(), expected.len());
}
