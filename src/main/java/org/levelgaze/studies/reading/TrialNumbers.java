package org.levelgaze.studies.reading;

import java.util.Arrays;

/** The trial numbers of a file, and the row in which each first stands. */
final class TrialNumbers {

    private int[] firstRow = new int[16];
    private int highest;

    /** Notes a number, and whether a call was made in it. */
    void note(int number, int row, boolean called) {
        if (number >= firstRow.length) {
            firstRow = Arrays.copyOf(firstRow, number + number / 2 + 1);
        }
        if (firstRow[number] == 0) {
            firstRow[number] = row;
        }
        if (called) {
            highest = Math.max(highest, number);
        }
    }

    /** Names each gap below the highest number with a call, at the first row of the number that follows it. */
    void nameGaps(String column, BadRows bad) {
        int missing = 0;
        for (int number = 1; number <= highest; number++) {
            if (firstRow[number] == 0 && missing == 0) {
                missing = number;
            }
            if (firstRow[number] != 0 && missing != 0) {
                String value = Integer.toString(number);
                bad.add(firstRow[number], column, value, "trial-gap", column, value, Integer.toString(missing));
                missing = 0;
            }
        }
    }
}
