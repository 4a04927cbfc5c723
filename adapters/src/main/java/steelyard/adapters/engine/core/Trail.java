package steelyard.adapters.engine.core;

import java.util.Arrays;

/**
 * The changes in force, oldest first, as parallel arrays; the index of a change is its time.
 *
 * <p>A change is a raised bound (handle ≥ 0 and the bound before it) or a hole ({@code ~variable}
 * and the value). The columns by, why and previous exist for explanations and are kept only with
 * learning; without it, a handle appears once per level, with the bound at the level's start.
 */
final class Trail {
  final boolean learning;
  int[] handle = new int[1024];
  int[] old = new int[1024];
  int[] by;
  int[] why;
  int[] previous;
  int top;
  private int[] levelTop = new int[64];
  private int[] notes = new int[0];
  private int notesTop;
  private int[] levelNotes = new int[64];

  Trail(boolean learning) {
    this.learning = learning;
    if (learning) {
      by = new int[1024];
      why = new int[1024];
      previous = new int[1024];
      notes = new int[256];
    }
  }

  /** Appends a change and returns its time. */
  int add(int changed, int before) {
    if (top == handle.length) {
      grow();
    }
    handle[top] = changed;
    old[top] = before;
    return top++;
  }

  private void grow() {
    int room = 2 * top;
    handle = Arrays.copyOf(handle, room);
    old = Arrays.copyOf(old, room);
    if (learning) {
      by = Arrays.copyOf(by, room);
      why = Arrays.copyOf(why, room);
      previous = Arrays.copyOf(previous, room);
    }
  }

  /** Marks the start of the level after {@code level}. */
  void push(int level) {
    if (level == levelTop.length) {
      levelTop = Arrays.copyOf(levelTop, 2 * level);
      levelNotes = Arrays.copyOf(levelNotes, 2 * level);
    }
    levelTop[level] = top;
    levelNotes[level] = notesTop;
  }

  /** The time at which the level after {@code level} began. */
  int start(int level) {
    return levelTop[level];
  }

  /** Drops the notes made after {@code level} was left. */
  void popNotes(int level) {
    notesTop = levelNotes[level];
  }

  /** Keeps three ints for a later explanation and returns where they are. */
  int note(int a, int b, int c) {
    if (notesTop + 3 > notes.length) {
      notes = Arrays.copyOf(notes, 2 * notes.length);
    }
    notes[notesTop] = a;
    notes[notesTop + 1] = b;
    notes[notesTop + 2] = c;
    notesTop += 3;
    return notesTop - 3;
  }

  int noted(int note, int i) {
    return notes[note + i];
  }
}
