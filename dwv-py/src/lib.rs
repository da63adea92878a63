//! The Python face of the engine.
