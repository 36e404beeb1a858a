package emberline.reports.attach;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertNotEquals;
import static org.junit.jupiter.api.Assertions.assertThrows;
import static org.junit.jupiter.api.Assertions.assertTrue;

import java.util.ArrayList;
import java.util.Collections;
import java.util.HashSet;
import java.util.List;
import java.util.Locale;
import java.util.Random;
import java.util.Set;
import org.junit.jupiter.api.Test;
import org.junit.jupiter.params.ParameterizedTest;
import org.junit.jupiter.params.provider.ValueSource;

class SafeFileNamesTest {

    @Test
    void plainNamesAreKept() {
        SafeFileNames names = SafeFileNames.of(List.of("J0355+1133", "a_b.c-1"));
        assertEquals("J0355+1133", names.stem("J0355+1133"));
        assertEquals("a_b.c-1", names.stem(1));
    }

    @ParameterizedTest
    @ValueSource(
            strings = {
                "../../etc/passwd",
                ".hidden",
                "-rf",
                "con",
                "NUL.txt",
                "a/b",
                "a\\b",
                "a:b",
                "tab\there",
                "dot.",
                "é",
                "\u2028",
                "<script>",
                "a\u0000b"
            })
    void unsafeNamesBecomeSafeAndMarked(String name) {
        String stem = SafeFileNames.of(List.of(name)).stem(name);
        assertTrue(stem.matches("[A-Za-z0-9+_][A-Za-z0-9+._-]*-[0-9a-f]{8}"), stem);
    }

    @Test
    void longNamesAreCut() {
        String stem = SafeFileNames.of(List.of("x".repeat(300))).stem(0);
        assertEquals(100, stem.length());
    }

    @Test
    void namesThatDifferOnlyInCaseBothGetAMark() {
        SafeFileNames names = SafeFileNames.of(List.of("Alpha", "alpha", "Beta"));
        assertTrue(names.stem("Alpha").matches("Alpha-[0-9a-f]{8}"));
        assertTrue(names.stem("alpha").matches("alpha-[0-9a-f]{8}"));
        assertEquals("Beta", names.stem("Beta"));
    }

    @Test
    void aNameThatLooksLikeAMarkedOneStaysUnique() {
        String marked = SafeFileNames.of(List.of("a b")).stem(0);
        SafeFileNames names = SafeFileNames.of(List.of("a b", marked));
        assertNotEquals(names.stem(0), names.stem(1));
    }

    @Test
    void repeatedNamesHaveStemsOfTheirOwn() {
        SafeFileNames names = SafeFileNames.of(List.of("twin", "twin", "twin"));
        assertEquals("twin", names.stem("twin"));
        assertEquals(3, Set.of(names.stem(0), names.stem(1), names.stem(2)).size());
    }

    @Test
    void orderDoesNotMatterAndAllAreUnique() {
        Random random = new Random(11);
        String signs = "abAB/.- é+";
        Set<String> drawn = new HashSet<>();
        while (drawn.size() < 400) {
            StringBuilder name = new StringBuilder("n");
            for (int i = random.nextInt(4); i >= 0; i--) {
                name.append(signs.charAt(random.nextInt(signs.length())));
            }
            drawn.add(name.toString());
        }
        List<String> names = new ArrayList<>(drawn);
        SafeFileNames one = SafeFileNames.of(names);
        List<String> shuffled = new ArrayList<>(names);
        Collections.shuffle(shuffled, random);
        SafeFileNames two = SafeFileNames.of(shuffled);
        Set<String> stems = new HashSet<>();
        for (String name : names) {
            assertEquals(one.stem(name), two.stem(name));
            assertTrue(stems.add(one.stem(name).toLowerCase(Locale.ROOT)), name);
        }
    }

    @Test
    void anUnknownNameIsRefused() {
        SafeFileNames names = SafeFileNames.of(List.of("a"));
        assertThrows(IllegalArgumentException.class, () -> names.stem("b"));
    }
}
