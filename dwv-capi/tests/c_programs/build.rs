//! Building and running C programs.

use std::io::Write;
use std::path::{Path, PathBuf};
use std::process::{Command, Output, Stdio};

/// The folder of the whole project.
pub fn root() -> PathBuf {
    Path::new(env!("CARGO_MANIFEST_DIR")).join("..")
}

/// The folder where what belongs to this test was built.
pub fn built() -> PathBuf {
    std::env::current_exe().unwrap().parent().unwrap().to_path_buf()
}

/// The static library, built with this test.
fn library() -> PathBuf {
    built().join("libdwv.a")
}

/// Where programs are written.
pub fn temporary() -> &'static Path {
    Path::new(env!("CARGO_TARGET_TMPDIR"))
}

/// The library with a function that panics: `cargo test` builds it as an example.
pub fn panicking_library() -> PathBuf {
    built().with_file_name("examples").join("libprovoked_panic.a")
}

/// Whether a program is installed.
pub fn is_at_hand(program: &str) -> bool {
    Command::new(program).arg("--version").output().is_ok_and(|output| output.status.success())
}

/// A C program that was built.
pub struct Program {
    pub path: PathBuf,
}

impl Program {
    /// Builds as C11 with the static library.
    pub fn new(source: &str) -> Self {
        Self::linked(source, &library())
    }

    /// Builds as C11 with a library.
    pub fn linked(source: &str, library: &Path) -> Self {
        Self::build(source, "cc", "c11", &[], library)
    }

    /// Builds as C++17 with the static library.
    pub fn cpp(source: &str) -> Self {
        Self::build(source, "c++", "c++17", &[], &library())
    }

    /// Builds with the sanitizers for addresses and undefined behaviour, when a program built with them runs here.
    pub fn sanitized(source: &str) -> Option<Self> {
        let flags = ["-fsanitize=address,undefined", "-fno-sanitize-recover=all"];
        let test = std::thread::current().name().unwrap_or("test").replace("::", "-");
        let empty = temporary().join(format!("empty-{test}"));
        let mut compiler = Command::new("cc");
        compiler.args(flags).args(["-x", "c", "-", "-o"]).arg(&empty).stdin(Stdio::piped()).stderr(Stdio::null());
        let mut child = compiler.spawn().ok()?;
        child.stdin.take()?.write_all(b"int main(void) { return 0; }").ok()?;
        let runs = child.wait().ok()?.success() && Command::new(&empty).status().ok()?.success();
        runs.then(|| Self::build(source, "cc", "c11", &flags, &library()))
    }

    fn build(source: &str, compiler: &str, standard: &str, flags: &[&str], library: &Path) -> Self {
        assert!(library.exists(), "{} is built by `cargo test -p dwv-capi`", library.display());
        let name = Path::new(source).file_stem().unwrap().to_string_lossy();
        // Tests run at once: each has its own file.
        let test = std::thread::current().name().unwrap_or("test").replace("::", "-");
        let path = temporary().join(format!("{name}-{standard}-{}-{test}", flags.len()));
        let output = Command::new(compiler)
            .args([&format!("-std={standard}"), "-Wall", "-Wextra", "-Werror", "-pedantic", "-g"])
            .args(flags)
            .arg("-I")
            .arg(root().join("include"))
            .args(["-x", if standard.contains("++") { "c++" } else { "c" }])
            .arg(root().join("dwv-capi").join(source))
            .args(["-x", "none"])
            .arg(library)
            .args(["-lpthread", "-ldl", "-lm", "-o"])
            .arg(&path)
            .output()
            .expect("a C compiler is at hand");
        assert!(output.status.success(), "{}", String::from_utf8_lossy(&output.stderr));
        Self { path }
    }

    /// Runs in the folder of the project, with text on standard input.
    pub fn run(&self, arguments: &[&str], input: &[u8]) -> Output {
        let mut child = Command::new(&self.path)
            .args(arguments)
            .current_dir(root())
            .stdin(Stdio::piped())
            .stdout(Stdio::piped())
            .stderr(Stdio::piped())
            .spawn()
            .unwrap();
        let mut stdin = child.stdin.take().unwrap();
        let input = input.to_vec();
        // A program that does not read all of it is no fault.
        let writer = std::thread::spawn(move || stdin.write_all(&input).is_ok());
        let output = child.wait_with_output().unwrap();
        writer.join().unwrap();
        output
    }
}
