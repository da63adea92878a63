# Two commands on a fresh machine with Rust, a C compiler and Python 3.11 or later: make demo, make test.
# Everything else that is needed is fetched into target/ and .venv/.

PYTHON ?= python3
OUT ?= out
VENV := .venv
BIN := $(VENV)/bin
TOOLS := "maturin>=1.16,<2" "pytest>=8" "hypothesis>=6" "mypy>=1.11" "ruff>=0.6"

.PHONY: demo test test-rust test-python verify bench lint clean

## size the example house, print its schedules and write them to $(OUT)/
demo: $(VENV)/installed
	$(BIN)/python python-examples/build_house.py $(OUT)

## every test of every face
test: test-rust test-python

test-rust:
	cargo test --workspace --exclude dwv-py --features dwv-core/schema

test-python: $(VENV)/installed
	$(BIN)/python -m pytest dwv-py/tests

## the published checks: source, expected, obtained
verify:
	cargo run -q --release -p dwv-core --example verify

## nanoseconds per pipe for reading and each pass, and instructions where valgrind is at hand
bench:
	cargo bench -q -p dwv-core --bench passes
	@sh dwv-core/benches/instructions.sh

lint: $(VENV)/installed
	cargo fmt --all --check
	cargo clippy --workspace --all-targets --features dwv-core/schema -- -D warnings
	$(BIN)/ruff check --config dwv-py/pyproject.toml dwv-py python-examples && $(BIN)/ruff format --config dwv-py/pyproject.toml --check dwv-py python-examples && $(BIN)/mypy --config-file dwv-py/pyproject.toml dwv-py/python python-examples dwv-py/tests

clean:
	rm -rf target $(VENV) $(OUT)

# The Python module, built whenever its sources are newer.
SOURCES := Cargo.toml Cargo.lock $(shell find dwv-core dwv-py -name '*.rs' -o -name '*.toml' -o -name '*.py' -o -name '*.pyi' | grep -v /tests/)

$(VENV)/installed: $(VENV)/tools $(SOURCES)
	$(BIN)/maturin develop -q --release -m dwv-py/Cargo.toml
	@touch $@

$(VENV)/tools: Makefile
	$(PYTHON) -m venv $(VENV)
	$(BIN)/python -m pip install -q --disable-pip-version-check $(TOOLS)
	@touch $@
