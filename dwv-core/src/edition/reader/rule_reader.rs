//! Rules: each by its name, with the parameter that the engine expects.

use std::collections::BTreeMap;

use serde::Deserialize;
use serde::de::DeserializeOwned;

use super::cite::Cites;
use super::raw::RawRule;
use crate::edition::{CitationId, Cited, FloorDrainExemption, RuleText, Rules, SiphonicArmLimits, SlopeFrom};
use crate::error::{Fault, FaultCode, Faults};
use crate::quantity::{Length, PipeSize, Slope, Written};

struct Reader<'a> {
    rules: BTreeMap<String, (RawRule, CitationId)>,
    taken: Vec<&'static str>,
    faults: &'a mut Faults,
}

impl Reader<'_> {
    fn missing(&mut self, name: &str) {
        let message = format!("the rule `{name}` is missing");
        self.faults.push(Fault::new(FaultCode::MissingKey, format!("rules.{name}"), message));
    }

    /// A rule without a parameter.
    fn plain(&mut self, name: &'static str) -> Option<Cited<()>> {
        self.taken.push(name);
        match self.rules.get(name) {
            Some((_, citation)) => Some(Cited { value: (), citation: *citation }),
            None => {
                self.missing(name);
                None
            }
        }
    }

    /// A rule with a parameter.
    fn value<T: DeserializeOwned>(&mut self, name: &'static str) -> Option<Cited<T>> {
        self.taken.push(name);
        let Some((raw, citation)) = self.rules.get(name) else {
            self.missing(name);
            return None;
        };
        let read = match &raw.value {
            Some(value) => value.clone().try_into::<T>().map_err(|error| error.to_string()),
            None => Err("it needs a `value`".to_owned()),
        };
        match read {
            Ok(value) => Some(Cited { value, citation: *citation }),
            Err(error) => {
                let message = format!("the rule `{name}` cannot be read: {error}");
                self.faults.push(Fault::new(FaultCode::WrongType, format!("rules.{name}"), message));
                None
            }
        }
    }

    fn length(&mut self, name: &'static str) -> Option<Cited<Length>> {
        self.value::<Written<Length>>(name).map(|rule| map(rule, |written| written.value))
    }

    fn slope(&mut self, name: &'static str) -> Option<Cited<SlopeFrom>> {
        #[derive(Deserialize)]
        #[serde(deny_unknown_fields)]
        struct Raw {
            size: PipeSize,
            slope: Written<Slope>,
        }
        self.value::<Raw>(name).map(|rule| map(rule, |raw| SlopeFrom { size: raw.size, slope: raw.slope.value }))
    }

    fn siphonic(&mut self, name: &'static str) -> Option<Cited<SiphonicArmLimits>> {
        #[derive(Deserialize)]
        #[serde(deny_unknown_fields)]
        struct Raw {
            most_vertical: Written<Length>,
            most_horizontal: Written<Length>,
            most_turn: u16,
        }
        self.value::<Raw>(name).map(|rule| {
            map(rule, |raw| SiphonicArmLimits {
                most_vertical: raw.most_vertical.value,
                most_horizontal: raw.most_horizontal.value,
                most_turn: raw.most_turn,
            })
        })
    }

    fn floor_drain(&mut self, name: &'static str) -> Option<Cited<FloorDrainExemption>> {
        #[derive(Deserialize)]
        #[serde(deny_unknown_fields)]
        struct Raw {
            least_trap: PipeSize,
            least_length: Written<Length>,
            most_fall_sizes: u32,
        }
        self.value::<Raw>(name).map(|rule| {
            map(rule, |raw| FloorDrainExemption {
                least_trap: raw.least_trap,
                least_length: raw.least_length.value,
                most_fall_sizes: raw.most_fall_sizes,
            })
        })
    }
}

fn map<T, U>(rule: Cited<T>, turn: impl FnOnce(T) -> U) -> Cited<U> {
    Cited { value: turn(rule.value), citation: rule.citation }
}

/// Reads all rules; none when one is missing or cannot be read.
pub(super) fn read(raw: BTreeMap<String, RawRule>, cites: &mut Cites, faults: &mut Faults) -> Option<Rules> {
    let mut rules = BTreeMap::new();
    let mut texts = Vec::with_capacity(raw.len());
    for (name, rule) in raw {
        let citation = cites.add(&rule.clause, &rule.says, rule.witness, &rule.sources, rule.note.as_deref(), faults);
        texts.push(RuleText {
            name: name.clone(),
            value: rule.value.as_ref().map_or_else(String::new, words),
            citation,
        });
        rules.insert(name, (rule, citation));
    }
    let mut reader = Reader { rules, taken: Vec::new(), faults };
    let read = take_all(&mut reader, texts);
    let unknown: Vec<String> =
        reader.rules.keys().filter(|name| !reader.taken.contains(&name.as_str())).cloned().collect();
    for name in unknown {
        let message = format!("the engine has no rule `{name}`");
        reader.faults.push(Fault::new(FaultCode::UnknownKey, format!("rules.{name}"), message));
    }
    read
}

fn take_all(reader: &mut Reader<'_>, texts: Vec<RuleText>) -> Option<Rules> {
    // Each is asked for before any is missed, so that all faults are reported together.
    let total_load = reader.plain("total_load");
    let unlisted_fixture = reader.plain("unlisted_fixture");
    let continuous_flow = reader.value("continuous_flow");
    let bathroom_group = reader.plain("bathroom_group");
    let no_smaller_than_upstream = reader.plain("no_smaller_than_upstream");
    let water_closet_least = reader.value("water_closet_least");
    let third_water_closet = reader.value("third_water_closet");
    let stack_water_closets = reader.value("stack_water_closets");
    let building_sewer_least = reader.value("building_sewer_least");
    let building_drain_underground_least = reader.value("building_drain_underground_least");
    let building_sewer_begins = reader.length("building_sewer_begins");
    let stack_offset = reader.length("stack_offset");
    let storey_allowance = reader.length("storey_allowance");
    let least_slope_small = reader.slope("least_slope_small");
    let least_slope_large = reader.slope("least_slope_large");
    let trap_is_outlet = reader.plain("trap_is_outlet");
    let outlet_pipe_longest = reader.length("outlet_pipe_longest");
    let trap_arm = reader.value("trap_arm");
    let trap_arm_siphonic = reader.siphonic("trap_arm_siphonic");
    let trap_needs_vent = reader.plain("trap_needs_vent");
    let floor_drain_unvented = reader.floor_drain("floor_drain_unvented");
    let wet_vent_water_closets = reader.value("wet_vent_water_closets");
    let wet_vent_order = reader.plain("wet_vent_order");
    let wet_vent_arm_most = reader.value("wet_vent_arm_most");
    let wet_vent_load = reader.plain("wet_vent_load");
    let wet_vent_upper_storey = reader.value("wet_vent_upper_storey");
    let wet_vent_tall = reader.value("wet_vent_tall");
    let stack_vent_required = reader.plain("stack_vent_required");
    let vent_stack_required = reader.value("vent_stack_required");
    let stack_vent_least_share = reader.plain("stack_vent_least_share");
    let one_large_vent = reader.value("one_large_vent");
    let vent_no_reduction = reader.plain("vent_no_reduction");
    let individual_dual_size = reader.plain("individual_dual_size");
    let branch_vent_inputs = reader.plain("branch_vent_inputs");
    let stack_vent_inputs = reader.plain("stack_vent_inputs");
    let vent_frost = reader.value("vent_frost");
    let vent_above_roof = reader.length("vent_above_roof");
    let vent_above_ground = reader.length("vent_above_ground");
    let valve_grounds = reader.plain("valve_grounds");
    let open_air_vent = reader.plain("open_air_vent");
    Some(Rules {
        total_load: total_load?,
        unlisted_fixture: unlisted_fixture?,
        continuous_flow: continuous_flow?,
        bathroom_group: bathroom_group?,
        no_smaller_than_upstream: no_smaller_than_upstream?,
        water_closet_least: water_closet_least?,
        third_water_closet: third_water_closet?,
        stack_water_closets: stack_water_closets?,
        building_sewer_least: building_sewer_least?,
        building_drain_underground_least: building_drain_underground_least?,
        building_sewer_begins: building_sewer_begins?,
        stack_offset: stack_offset?,
        storey_allowance: storey_allowance?,
        least_slope_small: least_slope_small?,
        least_slope_large: least_slope_large?,
        trap_is_outlet: trap_is_outlet?,
        outlet_pipe_longest: outlet_pipe_longest?,
        trap_arm: trap_arm?,
        trap_arm_siphonic: trap_arm_siphonic?,
        trap_needs_vent: trap_needs_vent?,
        floor_drain_unvented: floor_drain_unvented?,
        wet_vent_water_closets: wet_vent_water_closets?,
        wet_vent_order: wet_vent_order?,
        wet_vent_arm_most: wet_vent_arm_most?,
        wet_vent_load: wet_vent_load?,
        wet_vent_upper_storey: wet_vent_upper_storey?,
        wet_vent_tall: wet_vent_tall?,
        stack_vent_required: stack_vent_required?,
        vent_stack_required: vent_stack_required?,
        stack_vent_least_share: stack_vent_least_share?,
        one_large_vent: one_large_vent?,
        vent_no_reduction: vent_no_reduction?,
        individual_dual_size: individual_dual_size?,
        branch_vent_inputs: branch_vent_inputs?,
        stack_vent_inputs: stack_vent_inputs?,
        vent_frost: vent_frost?,
        vent_above_roof: vent_above_roof?,
        vent_above_ground: vent_above_ground?,
        valve_grounds: valve_grounds?,
        open_air_vent: open_air_vent?,
        texts,
    })
}

/// A parameter in words, for questions and the provenance page.
fn words(value: &toml::Value) -> String {
    match value {
        toml::Value::String(text) => text.clone(),
        toml::Value::Table(table) => {
            let parts: Vec<String> =
                table.iter().map(|(key, value)| format!("{} {}", key.replace('_', " "), words(value))).collect();
            parts.join(", ")
        }
        toml::Value::Integer(number) => number.to_string(),
        toml::Value::Float(number) => number.to_string(),
        toml::Value::Boolean(flag) => flag.to_string(),
        toml::Value::Array(values) => values.iter().map(words).collect::<Vec<_>>().join(", "),
        toml::Value::Datetime(_) => String::new(),
    }
}
