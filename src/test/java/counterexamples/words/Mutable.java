package counterexamples.words;

/** Can be changed from outside. */
public class Mutable {

    private String name = "";

    public void setName(String name) {
        this.name = name;
    }

    @Override
    public String toString() {
        return name;
    }
}
