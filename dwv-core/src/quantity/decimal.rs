//! Exact reading of numbers such as `12`, `12.25`, `3/8`, `9-1/2`, `9 1/2` and `½`.

/// A number as a fraction of integers.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub(super) struct Fraction {
    pub(super) numerator: i128,
    pub(super) denominator: i128,
}

impl Fraction {
    pub(super) const fn whole(value: i128) -> Self {
        Self { numerator: value, denominator: 1 }
    }

    /// The fraction times `factor`, to the nearest whole, halves away from zero.
    pub(super) fn times(self, factor: i128) -> Option<i128> {
        divide(self.numerator.checked_mul(factor)?, self.denominator)
    }

    pub(super) fn plus(self, other: Self) -> Option<Self> {
        let left = self.numerator.checked_mul(other.denominator)?;
        let right = other.numerator.checked_mul(self.denominator)?;
        Some(Self {
            numerator: left.checked_add(right)?,
            denominator: self.denominator.checked_mul(other.denominator)?,
        })
    }
}

/// `numerator / denominator` to the nearest whole, halves away from zero.
pub(super) fn divide(numerator: i128, denominator: i128) -> Option<i128> {
    if denominator <= 0 {
        return None;
    }
    let half = denominator / 2;
    let shifted = if numerator < 0 { numerator.checked_sub(half)? } else { numerator.checked_add(half)? };
    Some(shifted / denominator)
}

/// The longest number that is read, in digits: enough for any length in nanometres.
const MOST_DIGITS: usize = 24;

/// Reads an unsigned number at the start of `text`: the number and what follows it.
pub(super) fn leading(text: &str) -> Option<(Fraction, &str)> {
    let (first, rest) = simple(text)?;
    if first.denominator != 1 {
        return Some((first, rest));
    }
    // A whole number may be followed by a fraction: `9-1/2`, `9 1/2`, `9½`.
    let joined = rest.strip_prefix('-').or_else(|| rest.strip_prefix(' ')).map_or(rest, str::trim_start);
    match fraction(joined) {
        Some((part, after)) if part.numerator < part.denominator => Some((first.plus(part)?, after)),
        _ => Some((first, rest)),
    }
}

/// A decimal number or a fraction.
fn simple(text: &str) -> Option<(Fraction, &str)> {
    fraction(text).or_else(|| decimal(text))
}

fn fraction(text: &str) -> Option<(Fraction, &str)> {
    const SIGNS: [(char, i128, i128); 9] = [
        ('½', 1, 2),
        ('¼', 1, 4),
        ('¾', 3, 4),
        ('⅛', 1, 8),
        ('⅜', 3, 8),
        ('⅝', 5, 8),
        ('⅞', 7, 8),
        ('⅓', 1, 3),
        ('⅔', 2, 3),
    ];
    for (sign, numerator, denominator) in SIGNS {
        if let Some(rest) = text.strip_prefix(sign) {
            return Some((Fraction { numerator, denominator }, rest));
        }
    }
    let (numerator, rest) = digits(text)?;
    let (denominator, rest) = digits(rest.strip_prefix('/')?)?;
    (denominator > 0).then_some((Fraction { numerator, denominator }, rest))
}

fn decimal(text: &str) -> Option<(Fraction, &str)> {
    let (whole, rest) = match digits(text) {
        Some(found) => found,
        None if text.starts_with('.') => (0, text),
        None => return None,
    };
    let Some(after_point) = rest.strip_prefix('.') else { return Some((Fraction::whole(whole), rest)) };
    let length = after_point.bytes().take_while(u8::is_ascii_digit).count();
    if length == 0 || length > MOST_DIGITS {
        return None;
    }
    let mut value = Fraction::whole(whole);
    for digit in after_point.bytes().take(length) {
        value.numerator = value.numerator.checked_mul(10)?.checked_add(i128::from(digit - b'0'))?;
        value.denominator = value.denominator.checked_mul(10)?;
    }
    Some((value, &after_point[length..]))
}

fn digits(text: &str) -> Option<(i128, &str)> {
    let length = text.bytes().take_while(u8::is_ascii_digit).count();
    if length == 0 || length > MOST_DIGITS {
        return None;
    }
    text[..length].parse().ok().map(|value| (value, &text[length..]))
}

/// Takes a sign off the front: whether the number is negative, and the rest.
pub(super) fn sign(text: &str) -> (bool, &str) {
    if let Some(rest) = text.strip_prefix('-').or_else(|| text.strip_prefix('−')) {
        return (true, rest.trim_start());
    }
    (false, text.strip_prefix('+').map_or(text, str::trim_start))
}

/// Whether the text holds a digit, a comma and a digit, as in `1,5`.
pub(super) fn has_decimal_comma(text: &str) -> bool {
    text.as_bytes().windows(3).any(|three| three[0].is_ascii_digit() && three[1] == b',' && three[2].is_ascii_digit())
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn reads_the_ways_people_write_numbers() {
        let read = |text: &str| leading(text).map(|(value, rest)| (value.times(64), rest.to_owned()));
        assert_eq!(read("9-1/2 ft"), Some((Some(608), " ft".to_owned())));
        assert_eq!(read("9 1/2"), Some((Some(608), String::new())));
        assert_eq!(read("9½"), Some((Some(608), String::new())));
        assert_eq!(read("0.25x"), Some((Some(16), "x".to_owned())));
        assert_eq!(read("3/8"), Some((Some(24), String::new())));
        assert_eq!(read("12 3"), Some((Some(768), " 3".to_owned())));
        assert_eq!(read("x"), None);
        assert_eq!(read("1/0"), Some((Some(64), "/0".to_owned())));
    }

    #[test]
    fn halves_go_away_from_zero() {
        assert_eq!((divide(5, 2), divide(-5, 2), divide(4, 3)), (Some(3), Some(-3), Some(1)));
    }
}
