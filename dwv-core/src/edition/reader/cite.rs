//! Gathers the citations of an edition.

use super::raw::{RawReading, RawTable};
use crate::edition::{Citation, CitationId, Cited, Source, SourceId, Witness};
use crate::error::{Fault, FaultCode, Faults, nearest};

pub(super) struct Cites {
    keys: Vec<String>,
    list: Vec<Citation>,
}

impl Cites {
    pub(super) fn new(sources: &[Source]) -> Self {
        Self { keys: sources.iter().map(|source| source.key.clone()).collect(), list: Vec::new() }
    }

    pub(super) fn witnesses(&self) -> Vec<Witness> {
        self.list.iter().map(|citation| citation.witness).collect()
    }

    pub(super) fn list(self) -> Vec<Citation> {
        self.list
    }

    /// A citation with everything said.
    pub(super) fn add(
        &mut self,
        clause: &str,
        subject: &str,
        witness: Witness,
        sources: &[String],
        note: Option<&str>,
        faults: &mut Faults,
    ) -> CitationId {
        let mut known = Vec::with_capacity(sources.len());
        for key in sources {
            match self.keys.iter().position(|listed| listed == key) {
                Some(index) => known.push(SourceId(u16::try_from(index).unwrap_or(u16::MAX))),
                None => {
                    let fault = Fault::new(FaultCode::UnknownId, subject, format!("no source has the key `{key}`"));
                    faults.push(match nearest(key, self.keys.iter().map(String::as_str)) {
                        Some(near) => fault.help(format!("did you mean `{near}`?")),
                        None => fault,
                    });
                }
            }
        }
        let id = CitationId(u16::try_from(self.list.len()).unwrap_or(u16::MAX));
        self.list.push(Citation {
            clause: clause.to_owned(),
            subject: subject.to_owned(),
            witness,
            sources: known,
            note: note.map(str::to_owned),
        });
        id
    }

    /// The citation of a cell. A value from memory has no source, whatever its table has.
    pub(super) fn cell(
        &mut self,
        clause: &str,
        witness: Witness,
        sources: &[String],
        subject: &str,
        note: Option<&str>,
        faults: &mut Faults,
    ) -> CitationId {
        let sources = if matches!(witness, Witness::Memory | Witness::Unsure) { &[] } else { sources };
        self.add(clause, subject, witness, sources, note, faults)
    }

    /// The citation of a row.
    pub(super) fn row<R>(
        &mut self,
        table: &RawTable<R>,
        witness: Witness,
        note: Option<&str>,
        subject: &str,
        faults: &mut Faults,
    ) -> CitationId {
        let note = note.or(table.note.as_deref());
        self.cell(&table.clause, witness, &table.sources, subject, note, faults)
    }

    pub(super) fn reading<T>(&mut self, name: &str, raw: RawReading<T>, faults: &mut Faults) -> Cited<T> {
        let subject = format!("reading: {name}");
        let citation = self.add(&raw.clause, &subject, raw.witness, &raw.sources, Some(&raw.note), faults);
        Cited { value: raw.reading, citation }
    }
}
