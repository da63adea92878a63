//! Code editions.
