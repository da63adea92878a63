//! Sizing one network again allocates nothing: counted by the allocator of this test.

#[path = "../benches/drawings.rs"]
mod drawings;

use std::alloc::{GlobalAlloc, Layout as Memory, System};
use std::cell::Cell;

use dwv_core::{Columns, Edition, Layout, Network};

struct Counting;

thread_local! {
    static COUNT: Cell<usize> = const { Cell::new(0) };
}

// SAFETY: every call is passed on to the system's allocator unchanged; counting touches a plain cell of this thread.
unsafe impl GlobalAlloc for Counting {
    unsafe fn alloc(&self, memory: Memory) -> *mut u8 {
        COUNT.with(|count| count.set(count.get() + 1));
        // SAFETY: the caller keeps the contract of `alloc`.
        unsafe { System.alloc(memory) }
    }

    unsafe fn dealloc(&self, pointer: *mut u8, memory: Memory) {
        // SAFETY: the pointer came from `System` with the same layout.
        unsafe { System.dealloc(pointer, memory) }
    }

    unsafe fn realloc(&self, pointer: *mut u8, memory: Memory, size: usize) -> *mut u8 {
        COUNT.with(|count| count.set(count.get() + 1));
        // SAFETY: the pointer came from `System` with the same layout.
        unsafe { System.realloc(pointer, memory, size) }
    }
}

#[global_allocator]
static ALLOCATOR: Counting = Counting;

fn allocations(work: impl FnOnce()) -> usize {
    let before = COUNT.with(Cell::get);
    work();
    COUNT.with(Cell::get) - before
}

#[test]
fn sizing_again_allocates_nothing() {
    let edition = Edition::builtin("npc-2015").unwrap();
    let layout = Layout::from_json(drawings::street(3).as_bytes()).unwrap();
    let network = Network::new(&layout, &edition).unwrap();
    assert_eq!(network.drains.len() + network.vents.len(), 3 * drawings::PIPES_OF_A_HOUSE + 2);
    let mut columns = Columns::default();
    assert!(allocations(|| columns.run(&network, &edition)) > 0, "the first run fills the columns");
    assert_eq!(allocations(|| columns.run(&network, &edition)), 0);
}
