//! The C face of the engine.
