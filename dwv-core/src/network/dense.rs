//! Typed dense ids: a number that fits the columns of one kind of thing only.

use std::num::NonZeroU32;

macro_rules! dense_id {
    ($(#[$doc:meta])* $name:ident) => {
        $(#[$doc])*
        #[derive(Debug, Clone, Copy, PartialEq, Eq, PartialOrd, Ord, Hash)]
        pub struct $name(NonZeroU32);

        impl $name {
            /// The id of the element with this index. Indices beyond four thousand million stick at the last.
            #[must_use]
            pub fn new(index: usize) -> Self {
                let number = u32::try_from(index).unwrap_or(u32::MAX).saturating_add(1);
                Self(NonZeroU32::new(number).unwrap_or(NonZeroU32::MAX))
            }

            /// The index into the columns.
            #[must_use]
            pub fn index(self) -> usize {
                self.0.get() as usize - 1
            }
        }
    };
}

dense_id! {
    /// A drain of a [`super::Network`].
    DrainId
}
dense_id! {
    /// A vent of a [`super::Network`].
    VentId
}
dense_id! {
    /// A fixture of a [`super::Network`].
    FixtureId
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn an_absent_id_costs_nothing() {
        assert_eq!(std::mem::size_of::<Option<DrainId>>(), 4);
        assert_eq!(DrainId::new(7).index(), 7);
    }
}
