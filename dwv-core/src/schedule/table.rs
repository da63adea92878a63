//! A table as aligned text and as CSV.

/// A table of texts.
#[derive(Debug, Clone, PartialEq, Eq)]
pub struct Table {
    /// What it is called.
    pub title: String,
    /// The heads of its columns.
    pub heads: Vec<String>,
    /// Which columns are set to the right.
    pub right: Vec<bool>,
    /// Its rows, each with a cell for each column.
    pub rows: Vec<Vec<String>>,
}

impl Table {
    pub(super) fn new(title: &str, columns: &[(&str, bool)]) -> Self {
        Self {
            title: title.to_owned(),
            heads: columns.iter().map(|(head, _)| (*head).to_owned()).collect(),
            right: columns.iter().map(|(_, right)| *right).collect(),
            rows: Vec::new(),
        }
    }

    /// Aligned text with its title and heads.
    #[must_use]
    pub fn to_text(&self) -> String {
        let widths: Vec<usize> = (0..self.heads.len())
            .map(|column| {
                let cells = self.rows.iter().map(|row| row[column].chars().count());
                cells.max().unwrap_or(0).max(self.heads[column].chars().count())
            })
            .collect();
        let mut text = format!("{}\n", self.title);
        self.write_line(&mut text, &self.heads, &widths);
        let rule: Vec<String> = widths.iter().map(|width| "-".repeat(*width)).collect();
        self.write_line(&mut text, &rule, &widths);
        for row in &self.rows {
            self.write_line(&mut text, row, &widths);
        }
        text
    }

    fn write_line(&self, text: &mut String, cells: &[String], widths: &[usize]) {
        let mut line = String::new();
        for ((cell, width), right) in cells.iter().zip(widths).zip(&self.right) {
            let blank = " ".repeat(width.saturating_sub(cell.chars().count()));
            let (before, after) = if *right { (blank.as_str(), "") } else { ("", blank.as_str()) };
            line.push_str(before);
            line.push_str(cell);
            line.push_str(after);
            line.push_str("  ");
        }
        text.push_str(line.trim_end());
        text.push('\n');
    }

    /// Comma-separated values with a line of heads (RFC 4180). A text that a spreadsheet would take for a formula is led by an
    /// apostrophe.
    #[must_use]
    pub fn to_csv(&self) -> String {
        let mut text = String::new();
        for row in std::iter::once(&self.heads).chain(&self.rows) {
            let cells: Vec<String> = row.iter().map(|cell| csv_cell(cell)).collect();
            text.push_str(&cells.join(","));
            text.push_str("\r\n");
        }
        text
    }
}

fn csv_cell(cell: &str) -> String {
    let number = cell.parse::<f64>().is_ok();
    let guarded = if !number && cell.starts_with(['=', '+', '-', '@', '\t', '\r']) {
        format!("'{cell}")
    } else {
        cell.to_owned()
    };
    if guarded.contains([',', '"', '\n', '\r']) { format!("\"{}\"", guarded.replace('"', "\"\"")) } else { guarded }
}

#[cfg(test)]
mod tests {
    use super::*;

    fn table() -> Table {
        let mut table = Table::new("PIPES", &[("pipe", false), ("FU", true)]);
        table.rows.push(vec!["d1, \"main\"".to_owned(), "1.5".to_owned()]);
        table.rows.push(vec!["=d2".to_owned(), "24".to_owned()]);
        table
    }

    #[test]
    fn text_is_aligned() {
        assert_eq!(table().to_text(), "PIPES\npipe         FU\n----------  ---\nd1, \"main\"  1.5\n=d2          24\n");
    }

    #[test]
    fn csv_is_quoted_and_safe_in_spreadsheets() {
        assert_eq!(table().to_csv(), "pipe,FU\r\n\"d1, \"\"main\"\"\",1.5\r\n'=d2,24\r\n");
    }
}
