//! A set of pipe sizes.

use super::pipe_size::PipeSize;

/// Some of the pipe sizes, as a small set.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash, Default)]
pub struct PipeSizes(u16);

impl PipeSizes {
    /// Every size.
    #[must_use]
    pub fn all() -> Self {
        PipeSize::ALL.into_iter().collect()
    }

    /// With `size` added.
    #[must_use]
    pub const fn with(self, size: PipeSize) -> Self {
        Self(self.0 | 1 << size.index())
    }

    /// Whether `size` is among them.
    #[must_use]
    pub const fn contains(self, size: PipeSize) -> bool {
        self.0 & 1 << size.index() != 0
    }

    /// Whether there is none.
    #[must_use]
    pub const fn is_empty(self) -> bool {
        self.0 == 0
    }

    /// The smallest.
    #[must_use]
    pub fn smallest(self) -> Option<PipeSize> {
        PipeSize::from_index(self.0.trailing_zeros() as usize)
    }

    /// The largest.
    #[must_use]
    pub fn largest(self) -> Option<PipeSize> {
        PipeSize::from_index(self.0.checked_ilog2()? as usize)
    }

    /// The smallest that is no smaller than `size`.
    #[must_use]
    pub fn at_least(self, size: PipeSize) -> Option<PipeSize> {
        Self(self.0 >> size.index() << size.index()).smallest()
    }

    /// The next one larger than `size`.
    #[must_use]
    pub fn next_larger(self, size: PipeSize) -> Option<PipeSize> {
        self.at_least(PipeSize::from_index(size.index() + 1)?)
    }

    /// All of them, the smallest first.
    pub fn iter(self) -> impl Iterator<Item = PipeSize> {
        let mut left = self.0;
        std::iter::from_fn(move || {
            let size = Self(left).smallest()?;
            left &= left - 1;
            Some(size)
        })
    }
}

impl FromIterator<PipeSize> for PipeSizes {
    fn from_iter<I: IntoIterator<Item = PipeSize>>(sizes: I) -> Self {
        sizes.into_iter().fold(Self::default(), Self::with)
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn finds_sizes_in_order() {
        let sizes: PipeSizes = [PipeSize::Four, PipeSize::Two, PipeSize::OneAndHalf].into_iter().collect();
        assert_eq!(sizes.iter().collect::<Vec<_>>(), [PipeSize::OneAndHalf, PipeSize::Two, PipeSize::Four]);
        assert_eq!(sizes.at_least(PipeSize::Three), Some(PipeSize::Four));
        assert_eq!(sizes.next_larger(PipeSize::Two), Some(PipeSize::Four));
        assert_eq!(sizes.next_larger(PipeSize::Four), None);
        assert_eq!((sizes.smallest(), sizes.largest()), (Some(PipeSize::OneAndHalf), Some(PipeSize::Four)));
        assert_eq!(PipeSizes::default().smallest(), None);
    }
}
