//! Where every value of an edition comes from, as a page.

use super::{CitationId, Edition, Witness};

impl Edition {
    /// Every citation whose value nobody here has seen in print.
    pub fn unattested(&self) -> impl Iterator<Item = CitationId> + '_ {
        (0..self.citations.len())
            .map(|index| CitationId(u16::try_from(index).unwrap_or(u16::MAX)))
            .filter(|id| !self.witness(*id).is_attested())
    }

    /// Every table, rule and reading with its clause, its witness and its sources, in Markdown.
    #[must_use]
    pub fn provenance(&self) -> String {
        let mut page = format!("# {}: where its values come from\n\n", self.title);
        page.push_str(
            "Results support, and do not replace, the local code in force, the authority having jurisdiction and a \
             licensed practitioner. Before a value that nobody here has seen in print decides anything, compare it with the \
             adopted text.\n\n",
        );
        self.write_counts(&mut page);
        self.write_open_questions(&mut page);
        self.write_citations(&mut page);
        self.write_sources(&mut page);
        page
    }

    fn write_counts(&self, page: &mut String) {
        page.push_str("| how sure | values |\n|---|---:|\n");
        for witness in [
            Witness::PrintedTwo,
            Witness::PrintedOne,
            Witness::PrintedProvincial,
            Witness::CommonPractice,
            Witness::Engine,
            Witness::Disputed,
            Witness::Memory,
            Witness::Unsure,
        ] {
            let count = self.citations.iter().filter(|citation| citation.witness == witness).count();
            page.push_str(&format!("| {} | {count} |\n", witness.words()));
        }
        let unattested = self.unattested().count();
        page.push_str(&format!(
            "\n{unattested} of {} values were not seen in print or are disputed.\n",
            self.citations.len()
        ));
    }

    fn write_open_questions(&self, page: &mut String) {
        page.push_str("\n## Open questions, with the reading taken\n\n");
        for question in &self.open_questions {
            page.push_str(&format!("- {question}\n"));
        }
    }

    fn write_citations(&self, page: &mut String) {
        page.push_str("\n## Values\n\n| clause | value | how sure | sources | note |\n|---|---|---|---|---|\n");
        for citation in &self.citations {
            let sources: Vec<&str> =
                citation.sources.iter().map(|source| self.sources[source.index()].key.as_str()).collect();
            page.push_str(&format!(
                "| {} | {} | {} | {} | {} |\n",
                citation.clause,
                citation.subject,
                citation.witness.words(),
                sources.join(", "),
                citation.note.as_deref().unwrap_or("")
            ));
        }
    }

    fn write_sources(&self, page: &mut String) {
        page.push_str("\n## Sources\n\n");
        for source in &self.sources {
            page.push_str(&format!("- {}: {}, <{}>\n", source.key, source.title, source.url));
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn values_from_memory_name_no_source() {
        let edition = Edition::builtin("npc-2015").unwrap();
        for citation in &edition.citations {
            let memory = matches!(citation.witness, Witness::Memory | Witness::Unsure);
            assert!(!memory || citation.sources.is_empty(), "{citation:?}");
        }
    }
}
